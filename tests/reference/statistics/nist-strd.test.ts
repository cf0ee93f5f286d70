import { describe, expect, it } from 'vitest';
import { oneWayAnova, type OneWayAnova } from '@/lib/statistics/anova/one-way';
import { lagOneAutocorrelation, meanOf, standardDeviation } from '@/lib/statistics/summary/moments';
import { digitsAgreed } from './log-relative-error';
import reference from './nist-strd.json';

describe('NIST StRD univariate', () => {
  /** The data of NumAcc3 as numbers of 53 bits already differ from the certified decimals in the tenth digit of the spread. */
  const digits: Record<string, number> = { Lottery: 14, Mavro: 12.5, NumAcc1: 15, NumAcc3: 9.4 };
  it.each(reference.univariate)(
    '$dataset: mean, standard deviation and autocorrelation',
    ({ dataset, data, certified }) => {
      expect(digitsAgreed(meanOf(data), certified.mean)).toBeGreaterThanOrEqual(14.9);
      expect(digitsAgreed(standardDeviation(data)!, certified.sd_n_minus_1)).toBeGreaterThanOrEqual(digits[dataset]!);
      expect(digitsAgreed(lagOneAutocorrelation(data)!, certified.lag1_autocorrelation)).toBeGreaterThanOrEqual(12);
    },
  );
});

type Certified = (typeof reference.anova)[number]['certified'];

function expectCertified(groups: number[][], certified: Certified, digits: number) {
  const found = oneWayAnova(groups) as OneWayAnova;
  expect(found.kind).toBe('found');
  expect(found.degreesBetween).toBe(certified.df_between);
  expect(found.degreesWithin).toBe(certified.df_within);
  const pairs: [number, number][] = [
    [found.squaresBetween, certified.ss_between],
    [found.squaresWithin, certified.ss_within],
    [found.meanSquareBetween, certified.ms_between],
    [found.meanSquareWithin, certified.ms_within],
    [found.f, certified.F],
    [found.rSquared, certified.r_squared],
    [found.residualDeviation, certified.residual_sd],
  ];
  for (const [value, expected] of pairs) expect(digitsAgreed(value, expected)).toBeGreaterThanOrEqual(digits);
}

function grouped(set: { group: number[]; y: number[] }, origin = 0): number[][] {
  const groups: number[][] = [];
  set.y.forEach((y, i) => (groups[set.group[i]! - 1] ??= []).push(origin ? Math.round((y - origin) * 10) / 10 : y));
  return groups;
}

describe('NIST StRD one-way analysis of variance', () => {
  const [resistors, small, shifted] = reference.anova;
  it('SiRstv, SmLs01: thirteen digits', () => {
    expectCertified(grouped(resistors!), resistors!.certified, 12.5);
    expectCertified(grouped(small!), small!.certified, 13);
  });
  it('SmLs03, 18009 readings: thirteen digits', () => {
    const { counted, certified } = reference.anovaCounted;
    const groups = counted.map((values) => values.flatMap(([y, count]) => new Array<number>(count!).fill(y!)));
    expectCertified(groups, certified, 13);
  });
  it('SmLs07, thirteen constant leading digits: fourteen digits once the constant is off, and otherwise all that 53 bits hold', () => {
    expectCertified(grouped(shifted!, 1e12), shifted!.certified, 14);
    // 1000000000000.4 as a number is off by 2e-5, which is 2e-4 of the spread: 4.4 digits are the data's own limit.
    expectCertified(grouped(shifted!), shifted!.certified, 4);
    expect(digitsAgreed((oneWayAnova(grouped(shifted!)) as OneWayAnova).f, exactF(grouped(shifted!)))).toBeGreaterThan(
      13,
    );
  });
});

/** F of the stored numbers by whole-number arithmetic; groups of equal size, readings multiples of 2^-13. */
function exactF(groups: number[][]): number {
  const whole = groups.map((group) => group.map((y) => BigInt(Math.round((y - 1e12) * 8192))));
  const n = BigInt(whole[0]!.length);
  const k = BigInt(whole.length);
  const add = (values: bigint[]) => values.reduce((sum, v) => sum + v, 0n);
  const sums = whole.map(add);
  const between = k * add(sums.map((s) => s * s)) - add(sums) ** 2n; // times n k
  const within = n * add(whole.flat().map((v) => v * v)) - add(sums.map((s) => s * s)); // times n
  const scale = 10n ** 20n;
  return Number((between * scale * (n * k - k)) / (k * (k - 1n) * within)) / 1e20;
}

import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { beforeAll, describe, expect, it } from 'vitest';
import { oneWayAnova, type OneWayAnova } from '@/lib/statistics/anova/one-way';
import { straightLine } from '@/lib/statistics/anova/straight-line';
import { andersonDarling } from '@/lib/statistics/capability/anderson-darling';
import { cpInterval } from '@/lib/statistics/capability/cp-interval';
import { cpkInterval } from '@/lib/statistics/capability/cpk-interval';
import { capabilityIndices } from '@/lib/statistics/capability/indices';
import { individualsBaseline } from '@/lib/statistics/charts/individuals';
import { biasOf } from '@/lib/statistics/gauge/bias';
import { gaugeStudy } from '@/lib/statistics/gauge/gauge-study';
import { nestedAnova } from '@/lib/statistics/gauge/nested-anova';
import { clopperPearson } from '@/lib/statistics/proportions/clopper-pearson';
import { wilson } from '@/lib/statistics/proportions/wilson';
import { lagOneAutocorrelation, meanOf, standardDeviation } from '@/lib/statistics/summary/moments';
import { expectedQuantile, sampleQuantile } from '@/lib/statistics/summary/quantiles';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';
import { drawNormal } from '@/lib/uncertainty/draw';

/** Another lot every time; LOT_SEED repeats one. */
const seed = Number(process.env.LOT_SEED ?? Date.now() % 1_000_000);
const uniform = wichmannHill(seed);
const times = <T>(n: number, make: (i: number) => T) => Array.from({ length: n }, (_, i) => make(i));

const limits = { min: 10.7, max: 10.9 };
const count = 60 + Math.floor(uniform() * 200);
const values = times(count, () => 10.8 + 0.02 * drawNormal(uniform) + (uniform() < 0.1 ? 0.03 : 0));
const station = times(count, () => 1 + Math.floor(uniform() * 3));
const passed = values.filter((v) => v > 10.77 && v < 10.83).length;
const size = { boards: 8, operators: 3, trials: 3 };
const board = times(72, (i) => Math.floor(i / 9));
const operator = times(72, (i) => Math.floor(i / 3) % 3);
const boards = times(size.boards, () => 0.04 * drawNormal(uniform));
const gauge = board.map((b, i) => 10.8 + boards[b]! + 0.004 * operator[i]! + 0.005 * drawNormal(uniform));
const x = times(30, (i) => 8 + (i % 5) * 0.7);
const y = x.map((at) => 0.002 * (at - 9) + 0.004 * drawNormal(uniform));

const R: Record<string, number[]> = {};

beforeAll(() => {
  const input = { values, limits: [limits.min, limits.max], station, passed: [passed], gauge, board, operator, x, y };
  const script = fileURLToPath(new URL('./lot.R', import.meta.url));
  const run = spawnSync('Rscript', ['--vanilla', script], {
    input: Object.entries(input)
      .map(([name, numbers]) => `${name}:${numbers.join(' ')}\n`)
      .join(''),
    encoding: 'utf8',
  });
  if (run.status !== 0) throw new Error(`R (Debian's r-base-core) is needed: ${run.error?.message ?? run.stderr}`);
  for (const line of run.stdout.trim().split('\n')) {
    const [name, numbers] = line.split(': ');
    R[name!] = numbers!.split(' ').map(Number);
  }
});

function expectClose(ours: number[], name: string) {
  expect(R[name], name).toHaveLength(ours.length);
  ours.forEach((value, i) => {
    const error = Math.abs(value - R[name]![i]!);
    expect(error, `${name}[${i}]: ${value}, R ${R[name]![i]}`).toBeLessThan(1e-9 * Math.abs(R[name]![i]!) + 1e-13);
  });
}

const found = <T extends { kind: string }>(result: T) => {
  if (result.kind !== 'found') throw new Error(result.kind);
  return result as Extract<T, { kind: 'found' }>;
};

describe(`a random lot, seed ${seed}, agrees with R to nine digits`, () => {
  const mean = meanOf(values);
  const sd = standardDeviation(values)!;
  it('moments and quantiles', () => {
    expectClose([mean, sd, lagOneAutocorrelation(values)!], 'moments');
    const shares = [0.00135, 0.1, 0.5, 0.99865];
    expectClose(
      shares.map((p) => expectedQuantile(values, p)),
      'quantiles6',
    );
    expectClose(
      shares.map((p) => sampleQuantile(values, p)),
      'quantiles7',
    );
  });
  it('limits of the individuals chart', () => {
    const { lower, upper } = found(individualsBaseline(values)).individuals;
    expectClose([lower, upper], 'individuals');
  });
  it('capability with intervals', () => {
    const { cp, cpk } = capabilityIndices(mean, sd, limits)!;
    const ofCpk = cpkInterval(cpk, count);
    expectClose([cpk, ofCpk.low, ofCpk.high], 'cpk');
    const ofCp = cpInterval(cp!, count - 1);
    expectClose([ofCp.low, ofCp.high], 'cp');
  });
  it('normality', () => expectClose([found(andersonDarling(values)).statistic], 'andersonDarling'));
  it('yield', () => {
    const exact = clopperPearson(passed, count);
    expectClose([exact.low, exact.high], 'exact');
    const scores = wilson(passed, count);
    expectClose([scores.low, scores.high], 'wilson');
  });
  it('stations compared', () => {
    const groups = [1, 2, 3].map((s) => values.filter((_, i) => station[i] === s));
    const a = oneWayAnova(groups) as OneWayAnova;
    expectClose([a.squaresBetween, a.squaresWithin, a.f, a.p], 'anova');
  });
  it('crossed gauge study, full and pooled', () => {
    const readings = gauge.map((value, i) => ({ value, board: `b${board[i]}`, operator: `o${operator[i]}` }));
    const { full, pooled } = found(gaugeStudy(readings, 0.2)).anova;
    const squares = [full.board, full.operator, full.interaction, full.repeat].map((row) => row.squares);
    expectClose([...squares, full.interaction.f!, full.interaction.p!], 'crossed');
    const both = [pooled.board, pooled.operator];
    expectClose(
      [...both, pooled.repeat]
        .map((row) => row.squares)
        .concat(
          both.map((row) => row.f!),
          both.map((row) => row.p!),
        ),
      'pooled',
    );
  });
  it('nested gauge study', () => {
    const cells = times(3, (o) => times(8, (b) => gauge.filter((_, i) => board[i] === b && operator[i] === o)));
    const { operator: ofOperators, board: ofBoards, repeat } = found(nestedAnova(cells)).rows;
    const rows = [ofOperators, ofBoards, repeat];
    expectClose([...rows.map((row) => row.squares), ...rows.map((row) => row.meanSquare)], 'nested');
  });
  it('linearity and bias', () => {
    const line = found(straightLine(x.map((at, i) => ({ x: at, y: y[i]! }))));
    const { intercept: a, slope: b } = line;
    const band = line.at(9);
    expectClose(
      [a.estimate, b.estimate, a.standardError, b.standardError, a.p, b.p].concat(
        [line.residualDeviation, line.rSquared],
        [band.value, band.low, band.high],
      ),
      'line',
    );
    const bias = found(biasOf(y, 0));
    expectClose([bias.bias, bias.low, bias.high, bias.t, bias.p], 'bias');
  });
});

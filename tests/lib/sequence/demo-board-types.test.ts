import { describe, expect, it } from 'vitest';
import { boardTypes } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import { wiperForTrip } from '@/lib/circuit/inverse';
import { referenceAt, softKneeThresholds } from '@/lib/circuit/soft-knee';
import { boardTypeSchema, type BoardType } from '@/lib/contracts/board-type';

const pointsAt = (boardType: BoardType, wiper: number) => {
  const points = softKneeThresholds(boardType.design, wiper);
  if (points.kind !== 'found') throw new Error('no points');
  return points;
};
const share = (value: number, { min, max }: { min: number; max: number }) => (value - min) / (max - min);
const targetOf = (code: string) => {
  const { sequence } = sequences.find((s) => s.boardTypeCode === code)!;
  const step = sequence.steps.find((s) => s.kind === 'trim');
  return step?.kind === 'trim' ? step.targetVolts : NaN;
};

describe.each(boardTypes.map((type) => [type.code, type] as const))('demo board type %s', (code, boardType) => {
  const { design, limits, search, absoluteMaximumVolts } = boardType;
  const targetVolts = targetOf(code);
  const node = referenceAt(design.reference, targetVolts);
  const referenceVolts = node.kind === 'found' ? node.x : NaN;
  const wiper = wiperForTrip(design, targetVolts, referenceVolts);
  const atTarget = pointsAt(boardType, wiper);

  it('is a board type', () => {
    expect(boardTypeSchema.safeParse(boardType).success).toBe(true);
  });
  it('reaches its target well inside the travel', () => {
    expect(atTarget.tripVolts).toBeCloseTo(targetVolts, 6);
    expect(wiper).toBeGreaterThan(0.15);
    expect(wiper).toBeLessThan(0.85);
  });
  it('has all limits centred on the points at the target', () => {
    expect(share(atTarget.tripVolts, limits.tripVolts)).toBeCloseTo(0.5, 6);
    for (const value of [
      share(atTarget.releaseVolts, limits.releaseVolts),
      share(atTarget.releaseVolts - atTarget.tripVolts, limits.hysteresisVolts),
      share(referenceVolts, limits.referenceVolts),
    ]) {
      expect(value).toBeGreaterThan(0.35);
      expect(value).toBeLessThan(0.65);
    }
  });
  it('stays inside its search ranges and below its absolute maximum over the whole travel', () => {
    const travel = Array.from({ length: 51 }, (_, i) => pointsAt(boardType, i / 50));
    travel.forEach(({ tripVolts, releaseVolts }, i) => {
      expect(tripVolts).toBeGreaterThan(search.tripVolts.min);
      expect(tripVolts).toBeLessThan(search.tripVolts.max);
      expect(releaseVolts - tripVolts).toBeGreaterThan(search.hysteresisVolts.min);
      expect(releaseVolts - tripVolts).toBeLessThan(search.hysteresisVolts.max);
      expect(releaseVolts).toBeLessThan(absoluteMaximumVolts);
      if (i > 0) expect(tripVolts).toBeLessThan(travel[i - 1]!.tripVolts);
    });
  });
  it('rides through an interruption as long as its limit', () => {
    const { sequence } = sequences.find((s) => s.boardTypeCode === code)!;
    const step = sequence.steps.find((s) => s.kind === 'ride-through');
    if (step?.kind !== 'ride-through') throw new Error('no ride-through');
    const amps = step.atVolts / design.loadOhms + design.quiescentAmps;
    const farads = design.reservoirFarads * 0.8;
    const sagged = step.atVolts * Math.exp((-step.milliseconds / 1000 / farads) * (amps / step.atVolts));
    expect(sagged).toBeGreaterThan(limits.tripVolts.max);
  });
  it('tells its output on from off at every supply of the search', () => {
    if (boardType.sensing.kind === 'output-voltage') {
      const { thresholdVolts } = boardType.sensing;
      expect(thresholdVolts).toBeGreaterThan(limits.outputLowVolts.max);
      expect(thresholdVolts).toBeLessThan(search.supplyMinVolts - limits.outputHighDropVolts.max);
    } else {
      const { thresholdAmps } = boardType.sensing;
      expect(thresholdAmps).toBeGreaterThan(limits.quiescentAmps.max);
      expect(thresholdAmps).toBeLessThan(search.supplyMinVolts / design.loadOhms);
    }
  });
  it('gives serial numbers of its own form', () => {
    const pattern = new RegExp(boardType.serialPattern);
    expect(pattern.test(`${code}264800184`)).toBe(true);
    expect(boardTypes.filter((type) => new RegExp(type.serialPattern).test(`${code}264800184`))).toHaveLength(1);
  });
});

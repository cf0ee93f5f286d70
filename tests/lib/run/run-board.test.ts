import { describe, expect, it } from 'vitest';
import type { DefectKind } from '@/lib/contracts/bench-command';
import type { LikelyCause, RejectReason } from '@/lib/run/types';
import { boardTypes } from '@/db/seed/board-types';
import { planFor, playBoard } from './play-board';

const codes = boardTypes.map((type) => type.code);

describe.each(codes)('a good board of type %s', (code) => {
  const played = playBoard(planFor(code), { seed: 11 });
  const { result, plant, screens, view } = played;

  it('passes, trimmed into its tolerance and verified after sealing', () => {
    expect(result).toMatchObject({
      verdict: 'pass',
      rejectReason: null,
      noVerdictReason: null,
      failingWhenStopped: false,
      supplyOff: { confirmed: true, by: 'meter' },
    });
    const points = plant.points();
    const trip = result.measurements.find((m) => m.quantity === 'trip-volts' && m.phase === 'verified')!;
    expect(Math.abs(trip.value - points.tripVolts)).toBeLessThan(0.003);
    expect(trip.expandedUncertainty!).toBeLessThan(0.006);
  });
  it('went through every step in order', () => {
    const order = [
      'seat:place-board',
      'seat:close-lid',
      'run.contact-check',
      'run.power-up',
      'run.reference',
      'run.find-points',
      'trim:measuring',
      'seal:open-lid',
      'seal:seal-screw',
      'seal:close-lid',
      'run.verify',
      'run.output-levels',
      'run.quiescent-current',
      'run.ride-through',
      'operator-check',
      'run.switching-off',
    ];
    const places = order.map((name) => screens.indexOf(name));
    expect(places.every((place) => place >= 0)).toBe(true);
    expect([...places].sort((a, b) => a - b)).toEqual(places);
  });
  it('never saw more than its absolute maximum, overshoot included', () => {
    expect(plant.peakVolts).toBeLessThanOrEqual(played.state.plan.boardType.absoluteMaximumVolts);
    expect(plant.supplyOn).toBe(false);
  });
  it('shows the pass with the time it took and every group done', () => {
    expect(view.screen).toMatchObject({ kind: 'pass' });
    expect(view.stepGroups.map((g) => g.state)).toEqual(view.stepGroups.map(() => 'done'));
    expect(view.supply.state).toBe('off');
  });
});

describe('a good board on a station without a fixture controller', () => {
  it('is confirmed at the screen and passes a sequence without ride-through', () => {
    const plan = planFor('CB1210', { hasController: false });
    const steps = plan.sequence.steps.filter((step) => step.kind !== 'ride-through');
    const { result, screens, effects } = playBoard({ ...plan, sequence: { ...plan.sequence, steps } }, { seed: 3 });
    expect(result.verdict).toBe('pass');
    expect(screens).toContain('seat:confirm-lid-and-board');
    expect(effects.some((effect) => effect.kind === 'read-fixture' || effect.kind === 'pulse')).toBe(false);
  });
  it('has no verdict where the sequence interrupts the supply', () => {
    const { result } = playBoard(planFor('CB1210', { hasController: false }), { seed: 3 });
    expect(result).toMatchObject({ verdict: 'no-verdict', noVerdictReason: 'fixture-fault', faultCode: 'F-106' });
  });
});

const screw = 'trimmer-end-wiper-open-or-wrong-screw';
const signatures: [DefectKind, RejectReason[], LikelyCause][] = [
  ['supply-short', ['supply-current-at-limit'], 'short-or-reversed-part'],
  ['zener-open', ['reference-out-of-limits'], 'zener-open-or-reversed'],
  ['zener-reversed', ['reference-out-of-limits'], 'zener-reversed'],
  ['wrong-zener', ['reference-out-of-limits'], 'wrong-zener'],
  ['feedback-open', ['output-chatters'], 'feedback-open'],
  ['wrong-feedback', ['hysteresis-too-large', 'release-too-high'], 'wrong-feedback-resistor'],
  ['op-amp-missing', ['never-on'], 'op-amp-missing-or-dead'],
  ['output-shorted', ['never-off'], 'output-shorted'],
  ['wiper-open', ['trim-no-effect', 'trim-end-of-travel'], screw],
  ['trimmer-at-end', ['trim-no-effect', 'trim-end-of-travel'], screw],
  ['noisy-wiper', ['point-not-steady'], 'noisy-wiper-or-contact'],
  ['reservoir-missing', ['ride-through'], 'reservoir-missing'],
];

describe.each(codes)('a defective board of type %s', (code) => {
  it.each(signatures)('with %s is rejected for %j, likely %s', (defect, reasons, cause) => {
    const { result, plant } = playBoard(planFor(code), { seed: 5, defect });
    expect(result).toMatchObject({ verdict: 'reject', likelyCause: cause, supplyOff: { confirmed: true } });
    expect(reasons).toContain(result.rejectReason);
    expect(plant.supplyOn).toBe(false);
  });
  it('with a lifted contact has no verdict: that is the fixture’s', () => {
    const { result } = playBoard(planFor(code), { seed: 5, defect: 'lifted-contact' });
    expect(result).toMatchObject({ verdict: 'no-verdict', noVerdictReason: 'contact-lost', faultCode: 'F-102' });
  });
});

describe('a board that fails', () => {
  it('without a setting that meets all limits is rejected before the first prompt', () => {
    const { result, screens } = playBoard(planFor('CB1210'), { seed: 5, defect: 'wrong-feedback' });
    expect(result.verdict).toBe('reject');
    expect(screens.some((name) => name.startsWith('trim:'))).toBe(false);
  });
  it('whose operator says no is rejected for that', () => {
    const { result } = playBoard(planFor('CB1210'), { seed: 11, answer: false });
    expect(result).toMatchObject({ verdict: 'reject', rejectReason: 'operator-check-failed' });
  });
});

describe('an interruption shorter than asked for', () => {
  it('proves nothing about the board: no verdict, whatever the output did', () => {
    const { result } = playBoard(planFor('CB1210'), { seed: 11, pulseShare: 0.97 });
    expect(result).toMatchObject({ verdict: 'no-verdict', noVerdictReason: 'fixture-fault', faultCode: 'F-105' });
  });
  it('by some microseconds is allowed for', () => {
    const { result } = playBoard(planFor('CB1210'), { seed: 11, pulseShare: 0.9995 });
    expect(result.verdict).toBe('pass');
    const ridden = result.measurements.find((m) => m.quantity === 'ride-through-seconds')!;
    expect(ridden.value).toBeGreaterThanOrEqual(0.01);
  });
});

import { describe, expect, it } from 'vitest';
import { advanceRun, beginRun, resultOf } from '@/lib/run/run';
import type { RunPlan } from '@/lib/run/types';
import { viewRun } from '@/lib/run/view';
import type { Sequence, Step } from '@/lib/sequence/step';
import { before, changed, without } from '../steps/change-steps';
import { planFor, playBoard } from './play-board';
import { Plant } from './plant';

const common = { name: '', enabled: true };
const measure = (over: Partial<Extract<Step, { kind: 'measure-channel' }>>): Step => ({
  ...common,
  id: 'measure',
  kind: 'measure-channel',
  channel: 102,
  atVolts: null,
  settleMs: 60,
  integrationCycles: 1,
  minVolts: null,
  maxVolts: null,
  ...over,
});
const apply = (volts: number): Step => ({ ...common, id: 'apply', kind: 'apply-voltage', volts, waitMs: 200 });
const instruction = (over: Partial<Extract<Step, { kind: 'instruction' }>> = {}): Step => ({
  ...common,
  id: 'tell',
  kind: 'instruction',
  text: 'Fit the clip on the reservoir.',
  pictureId: null,
  supplyOff: true,
  ...over,
});
const branch = (over: Partial<Extract<Step, { kind: 'branch' }>>): Step => ({
  ...common,
  id: 'branch',
  kind: 'branch',
  quantity: 'trip-volts',
  is: 'above',
  value: 0,
  goTo: 's7',
  mostTimes: 2,
  ...over,
});

/** CB1210 without trimming: its screw stands at the target. */
const demo = planFor('CB1210');
/** Two repeats and a rough search are enough here. */
const quick = { repeats: 2, wantedUncertaintyVolts: 0.003 };
const base = {
  ...demo,
  sequence: changed(changed(demo.sequence, 'verify', quick), 'find-points', { wantedUncertaintyVolts: 0.003 }),
};
const still = without(base.sequence, 'trim', 'seal');
const play = (sequence: Sequence, more: Partial<RunPlan> = {}, startTripVolts = 10.8) =>
  playBoard({ ...base, ...more, sequence }, { seed: 21, startTripVolts });
const stepsGone = (played: ReturnType<typeof play>) =>
  played.state.path.map(({ stepIndex }) => played.state.plan.sequence.steps[stepIndex]!.id);

describe('measuring a channel', () => {
  const at13 = (over: object) => before(still, 'operator-check', measure({ atVolts: 13, ...over }));
  it('passes a value inside its limits and keeps it with its uncertainty', () => {
    const { result, plant } = play(at13({ minVolts: 11, maxVolts: 12.5 }));
    expect(result.verdict).toBe('pass');
    const measured = result.measurements.find((m) => m.quantity === 'channel-volts')!;
    expect(measured.value).toBeCloseTo(13 - 1.3, 1);
    expect(measured).toMatchObject({ phase: 'check', min: 11, max: 12.5, passed: true });
    expect(measured.guardedMax).toBeCloseTo(12.5 - measured.expandedUncertainty!, 9);
    expect(plant.peakVolts).toBeLessThan(15);
  });
  it.each([
    [{ minVolts: 11.9, maxVolts: null }, 11.9],
    [{ minVolts: null, maxVolts: 11.5 }, 11.5],
  ])('rejects one outside %o', (limits, limit) => {
    const { result, view } = play(at13(limits));
    expect(result).toMatchObject({ verdict: 'reject', rejectReason: 'channel-out-of-limits' });
    expect(view.screen).toMatchObject({ measured: { unit: 'V', limit } });
  });
  it('leaves the supply as it stands where no voltage is asked for', () => {
    const { effects, result } = play(
      before(still, 'operator-check', apply(13.2), measure({ channel: 101, minVolts: 13.1, maxVolts: 13.3 })),
    );
    expect(result.verdict).toBe('pass');
    const at = effects.findLastIndex((effect) => effect.kind === 'measure' && effect.channel === 101);
    expect(effects.slice(at - 2, at).map(({ kind }) => kind)).toEqual(['wait', 'wait']);
  });
});

describe('applying a voltage between the points', () => {
  const low = { channel: 102, maxVolts: 0.3 } as const;
  const high = { channel: 102, minVolts: 9 } as const;
  it('leaves an output on that comes from above', () => {
    const sequence = before(still, 'output-levels', apply(13.5), { ...apply(11.3), id: 'down' }, measure(high));
    expect(play(sequence).result.verdict).toBe('pass');
  });
  it('leaves an output off that comes from below', () => {
    const sequence = before(still, 'output-levels', apply(8), { ...apply(12.1), id: 'up' }, measure(low));
    expect(play(sequence).result.verdict).toBe('pass');
  });
  it('never overshoots the maximum, even next to it', () => {
    const { plant, result } = play(before(still, 'output-levels', apply(7), { ...apply(14.97), id: 'up' }));
    expect(result.verdict).toBe('pass');
    expect(plant.peakVolts).toBeGreaterThan(14.9);
    expect(plant.peakVolts).toBeLessThanOrEqual(15 + 0.003);
  });
  it('stays below the protection where that is set lower', () => {
    const sequence = changed(before(still, 'output-levels', apply(7), { ...apply(14.3), id: 'up' }), 'power-up', {
      overvoltageVolts: 14.35,
    });
    expect(play(sequence).plant.peakVolts).toBeLessThanOrEqual(14.36);
  });
});

describe('a soak', () => {
  const soak: Step = {
    ...common,
    id: 'soak',
    kind: 'soak',
    channel: 103,
    atVolts: 13,
    readings: 12,
    everyMs: 500,
    mostDriftVolts: 0.005,
  };
  const sequence = before(still, 'operator-check', soak);
  const drifting = (driftVoltsPerSecond: number) =>
    playBoard({ ...base, sequence }, { seed: 21, startTripVolts: 10.8, driftVoltsPerSecond });
  it('reads on a fixed beat and passes a value that stays', () => {
    const { result, events } = drifting(0);
    expect(result.verdict).toBe('pass');
    const times = events.flatMap((e) => (e.kind === 'measured' ? [e.atMs] : [])).slice(-12);
    for (const [i, atMs] of times.entries()) if (i > 0) expect(atMs - times[i - 1]!).toBeCloseTo(500, -1);
    const drift = result.measurements.find((m) => m.quantity === 'drift-volts')!;
    expect(drift.value).toBeLessThan(3 * drift.standardUncertainty! + 1e-4);
  });
  it('rejects one that walks away, with what it moved', () => {
    const { result } = drifting(0.002);
    expect(result).toMatchObject({ verdict: 'reject', rejectReason: 'drift-too-large' });
    expect(result.measurements.find((m) => m.quantity === 'drift-volts')!.value).toBeCloseTo(0.002 * 5.5, 3);
  });
});

describe('an instruction', () => {
  it.each([true, false])(
    'with the supply off lets the lid be opened and powers up again (controller: %s)',
    (hasController) => {
      const sequence = without(
        before(still, 'verify', instruction()),
        ...(hasController ? [] : ['ride-through' as const]),
      );
      const { result, screens, effects } = play(sequence, { hasController });
      expect(result.verdict).toBe('pass');
      const at = screens.indexOf('instruction');
      expect(screens.slice(at - 1, at + 5)).toEqual([
        'run.switching-off',
        'instruction',
        hasController ? 'seat:close-lid' : 'seat:confirm-lid-and-board',
        'run.contact-check',
        'run.power-up',
        'run.verify',
      ]);
      expect(effects.filter(({ kind }) => kind === 'supply-on')).toHaveLength(4);
    },
  );
  it('before the power-up or the record energises nothing by itself', () => {
    const early = before(before(still, 'power-up', instruction()), 'record', instruction({ id: 'late' }));
    const { result, effects } = play(early);
    expect(result.verdict).toBe('pass');
    expect(effects.filter(({ kind }) => kind === 'supply-on')).toHaveLength(2);
  });
  it('with the supply on ends without a verdict when the lid is opened', () => {
    const sequence = before(still, 'operator-check', instruction({ supplyOff: false }));
    const plan = { ...base, sequence };
    const plant = new Plant({ boardType: plan.boardType, seed: 3, startTripVolts: 10.8 });
    plant.lidClosed = plant.boardPresent = true;
    let { state, effects } = beginRun(plan, plant.nowMs);
    while (viewRun(state).screen.kind !== 'instruction') {
      ({ state, effects } = advanceRun(state, plant.perform(effects[0] as never)));
    }
    expect(viewRun(state).screen).toEqual({
      kind: 'instruction',
      text: 'Fit the clip on the reservoir.',
      pictureId: null,
      supplyOff: false,
    });
    ({ state, effects } = advanceRun(state, { atMs: plant.nowMs, kind: 'lid', closed: false }));
    expect(effects).toMatchObject([{ kind: 'supply-off' }]);
    ({ state } = advanceRun(state, plant.perform(effects[0] as never)));
    expect(resultOf(state)).toMatchObject({ verdict: 'no-verdict', noVerdictReason: 'lid-opened' });
  });
  it('ends without a verdict when the board is taken out meanwhile', () => {
    const plan = { ...base, sequence: before(still, 'verify', instruction()) };
    const plant = new Plant({ boardType: plan.boardType, seed: 3, startTripVolts: 10.8 });
    plant.lidClosed = plant.boardPresent = true;
    let { state, effects } = beginRun(plan, plant.nowMs);
    while (viewRun(state).screen.kind !== 'instruction') {
      ({ state, effects } = advanceRun(state, plant.perform(effects[0] as never)));
    }
    expect(state.facts.supply).toMatchObject({ state: 'off' });
    ({ state, effects } = advanceRun(state, { atMs: plant.nowMs, kind: 'board', present: false }));
    ({ state } = advanceRun(state, plant.perform(effects[0] as never)));
    expect(resultOf(state)).toMatchObject({ verdict: 'no-verdict', noVerdictReason: 'board-removed' });
  });
});

describe('a branch', () => {
  it('leaves out the trim of a board that comes in right', () => {
    const sequence = before(base.sequence, 'trim', branch({ value: 10.7, goTo: 's7' }));
    const right = play(sequence);
    expect(right.result).toMatchObject({ verdict: 'pass', trimRounds: 0 });
    expect(stepsGone(right)).not.toContain('s5');
    const wrong = play(sequence, {}, 10.4);
    expect(wrong.result.verdict).toBe('pass');
    expect(stepsGone(wrong)).toContain('s5');
  });
  it('goes back so often at most, and judges what was measured each time', () => {
    const played = play(before(still, 'output-levels', branch({})));
    expect(played.result.verdict).toBe('pass');
    expect(stepsGone(played).filter((id) => id === 's7')).toHaveLength(3);
    expect(played.result.measurements.filter((m) => m.quantity === 'trip-spread-volts')).toHaveLength(3);
  });
  it('back to the trim trims from the newest points, seals and verifies again', () => {
    const played = play(before(base.sequence, 'output-levels', branch({ goTo: 's5', mostTimes: 1 })), {}, 10.4);
    expect(played.result.verdict).toBe('pass');
    expect(stepsGone(played).filter((id) => ['s5', 's6', 's7'].includes(id))).toEqual([
      's5',
      's6',
      's7',
      's5',
      's6',
      's7',
    ]);
    const once = play(base.sequence, {}, 10.4);
    expect(played.result.trimRounds).toBeGreaterThanOrEqual(once.result.trimRounds);
    expect(played.result.adjustments.length).toBeGreaterThanOrEqual(once.result.adjustments.length);
  });
  it('is not taken on a value that was never measured', () => {
    const played = play(before(still, 'output-levels', branch({ quantity: 'drift-volts' })));
    expect(played.result.verdict).toBe('pass');
    expect(played.state.facts.branchesTaken).toEqual({});
  });
  it.each(['gone', 's11'])('to a step that is not there or not run (%s) has no verdict', (goTo) => {
    const sequence = changed(before(still, 'output-levels', branch({ goTo })), 'operator-check', { enabled: false });
    expect(play(sequence).result).toMatchObject({ verdict: 'no-verdict', noVerdictReason: 'interrupted' });
  });
  it('over the verification never makes a pass', () => {
    const sequence = before(still, 'verify', branch({ goTo: 's8', value: 0 }));
    expect(play(sequence).result).toMatchObject({ verdict: 'no-verdict', noVerdictReason: 'interrupted' });
  });
});

describe('a step that is not run', () => {
  it('is neither performed nor shown nor required', () => {
    const sequence = ['ride-through', 'operator-check', 'trim', 'seal'].reduce(
      (s, kind) => changed(s, kind as Step['kind'], { enabled: false }),
      base.sequence,
    );
    const { result, effects, screens, view } = play(sequence);
    expect(result.verdict).toBe('pass');
    expect(effects.some(({ kind }) => kind === 'pulse')).toBe(false);
    expect(screens).not.toContain('operator-check');
    expect(view.stepGroups.map(({ group }) => group)).toEqual(['seat', 'find', 'verify', 'check', 'record']);
  });
});

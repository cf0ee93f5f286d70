import { describe, expect, it } from 'vitest';
import { advanceRun, beginRun, resultOf, type Advance, type RunState } from '@/lib/run/run';
import type { RunEffect, RunEvent, RunPlan } from '@/lib/run/types';
import { viewRun } from '@/lib/run/view';
import { planFor } from './play-board';
import { Plant } from './plant';

type Stage = (state: RunState, effect: RunEffect | undefined) => boolean;

/** A run brought to the first moment at which `until` holds; the operator answers what is asked, but turns nothing. */
function runTo(until: Stage, over: Partial<RunPlan> = {}, startTripVolts?: number) {
  const plan = planFor('CB1210', over);
  const plant = new Plant({ boardType: plan.boardType, seed: 4, ...(startTripVolts ? { startTripVolts } : {}) });
  plant.lidClosed = plant.boardPresent = true;
  let now: Advance = beginRun(plan, plant.nowMs);
  for (let i = 0; i < 5000; i++) {
    const [effect] = now.effects;
    if (until(now.state, effect)) return { ...now, plant, effect };
    if (effect && effect.kind !== 'record-run') now = advanceRun(now.state, plant.perform(effect));
    else now = advanceRun(now.state, sealing(now.state, plant));
  }
  throw new Error('The stage never came.');
}

function sealing(state: RunState, plant: Plant): RunEvent {
  const { screen } = viewRun(state);
  if (screen.kind !== 'seal') throw new Error(`Waits at ${screen.kind}.`);
  plant.lidClosed = screen.wants !== 'open-lid';
  return { atMs: plant.nowMs, kind: 'lid', closed: plant.lidClosed };
}

const inStep =
  (kind: string): Stage =>
  (state, effect) =>
    state.plan.sequence.steps[state.stepIndex]?.kind === kind && effect?.kind === 'probe';
const searching = inStep('find-points');
const atMs = 90_000;
const offAnswer = (id: number): RunEvent => ({
  atMs,
  kind: 'supply-is-off',
  id,
  confirmed: true,
  volts: 0.2,
  by: 'meter',
});
const idOf = (effect: RunEffect | undefined) => (effect && 'id' in effect ? effect.id : NaN);

/** What the run asks after `event`, and its result once the supply is read back as off. */
function endBy(event: RunEvent, until: Stage = searching, over: Partial<RunPlan> = {}) {
  const before = runTo(until, over);
  const stopped = advanceRun(before.state, event);
  const ended = advanceRun(stopped.state, offAnswer(idOf(stopped.effects[0])));
  return { before, stopped, ended, result: resultOf(ended.state) };
}

describe('what ends a run at any time', () => {
  it.each<[RunEvent, string]>([
    [{ atMs, kind: 'stop' }, 'operator-stop'],
    [{ atMs, kind: 'bench-lost' }, 'bench-lost'],
    [{ atMs, kind: 'shutdown' }, 'shutdown'],
    [{ atMs, kind: 'lid', closed: false }, 'lid-opened'],
    [{ atMs, kind: 'board', present: false }, 'board-removed'],
    [{ atMs, kind: 'fault', id: null, reason: 'link-lost', code: 'L-310', detail: 'unplugged' }, 'link-lost'],
  ])('%o switches off first, then records no verdict %s', (event, reason) => {
    const { stopped, ended, result } = endBy(event);
    expect(stopped.effects.map((e) => e.kind)).toEqual(['supply-off']);
    expect(ended.effects.map((e) => e.kind)).toEqual(['record-run']);
    expect(result).toMatchObject({
      verdict: 'no-verdict',
      noVerdictReason: reason,
      rejectReason: null,
      failingWhenStopped: false,
      supplyOff: { confirmed: true, volts: 0.2, by: 'meter' },
    });
  });
  it('keeps what the instrument said of a fault for the record', () => {
    const before = runTo(searching);
    const fault: RunEvent = {
      atMs,
      kind: 'fault',
      id: idOf(before.effect),
      reason: 'supply-fault',
      code: 'S-204',
      detail: 'The supply did not answer for 2 s.',
    };
    const stopped = advanceRun(before.state, fault);
    const { state } = advanceRun(stopped.state, offAnswer(idOf(stopped.effects[0])));
    expect(resultOf(state)).toMatchObject({ faultCode: 'S-204', faultDetail: 'The supply did not answer for 2 s.' });
    const { screen } = viewRun(state);
    expect(screen).toMatchObject({ kind: 'no-verdict', reason: 'supply-fault', code: 'S-204' });
    expect(screen.kind === 'no-verdict' && screen.stoppedAtVolts).toBeGreaterThan(6);
  });
  it('ignores the late answer of the effect that was broken off', () => {
    const before = runTo(searching);
    const stopped = advanceRun(before.state, { atMs, kind: 'stop' });
    const late: RunEvent = { atMs, kind: 'probed', id: idOf(before.effect), voltsBefore: null, volts: 9, output: 'on' };
    expect(advanceRun(stopped.state, late)).toEqual({ state: stopped.state, effects: [] });
  });
  it('lets the first reason stand', () => {
    const before = runTo(searching);
    const stopped = advanceRun(before.state, { atMs, kind: 'stop' });
    const second = advanceRun(stopped.state, { atMs, kind: 'lid', closed: false });
    expect(second.effects).toEqual([]);
    const { state } = advanceRun(second.state, offAnswer(idOf(stopped.effects[0])));
    expect(resultOf(state)).toMatchObject({ noVerdictReason: 'operator-stop' });
  });
});

describe('a supply that is not confirmed off', () => {
  it('is asked once more, then recorded and shown as perhaps still on', () => {
    const before = runTo(searching);
    let now = advanceRun(before.state, { atMs, kind: 'stop' });
    for (let tries = 0; tries < 2; tries++) {
      expect(now.effects.map((e) => e.kind)).toEqual(['supply-off']);
      now = advanceRun(now.state, { atMs, kind: 'supply-is-off', id: idOf(now.effects[0]), confirmed: false });
    }
    expect(now.effects).toEqual([{ kind: 'record-run' }]);
    expect(resultOf(now.state)).toMatchObject({ supplyOff: { confirmed: false, volts: null, by: null } });
    expect(viewRun(now.state).supply).toEqual({ state: 'maybe-on' });
  });
  it('never lets a finished board pass', () => {
    const onTarget = planFor('CB1210').boardType.limits.tripVolts.min + 0.1;
    const before = runTo((_, effect) => effect?.kind === 'pulse', {}, onTarget);
    const steps = before.state.plan.sequence.steps;
    expect(steps[before.state.stepIndex]!.kind).toBe('ride-through');
    let now = advanceRun(before.state, before.plant.perform(before.effect as never));
    while (now.effects[0]?.kind !== 'supply-off') {
      const [effect] = now.effects;
      now = advanceRun(now.state, effect ? before.plant.perform(effect as never) : { atMs, kind: 'answer', ok: true });
    }
    now = advanceRun(now.state, { atMs, kind: 'supply-is-off', id: idOf(now.effects[0]), confirmed: false });
    now = advanceRun(now.state, offAnswer(idOf(now.effects[0])));
    expect(resultOf(now.state)).toMatchObject({ verdict: 'no-verdict', noVerdictReason: 'supply-fault' });
  });
  it('ends a run that waits for the lid to seal', () => {
    const onTarget = planFor('CB1210').boardType.limits.tripVolts.min + 0.1;
    const before = runTo((_, effect) => effect?.kind === 'supply-off' && _.stepIndex > 3, {}, onTarget);
    const now = advanceRun(before.state, { atMs, kind: 'supply-is-off', id: idOf(before.effect), confirmed: false });
    expect(now.effects.map((e) => e.kind)).toEqual(['supply-off']);
    expect(viewRun(now.state).supply).toEqual({ state: 'maybe-on' });
  });
});

describe('sealing', () => {
  const onTarget = planFor('CB1210').boardType.limits.tripVolts.min + 0.1;
  const opened: Stage = (state) => {
    const { screen } = viewRun(state);
    return screen.kind === 'seal' && screen.wants === 'seal-screw';
  };
  it('lets the lid be opened, since the supply is off', () => {
    expect(viewRun(runTo(opened, {}, onTarget).state).supply).toMatchObject({ state: 'off' });
  });
  it('ends without a verdict when the board is taken out, since another might come back', () => {
    const { state } = runTo(opened, {}, onTarget);
    const now = advanceRun(state, { atMs, kind: 'board', present: false });
    const { state: over } = advanceRun(now.state, offAnswer(idOf(now.effects[0])));
    expect(resultOf(over)).toMatchObject({ noVerdictReason: 'board-removed' });
  });
  it('ends without a verdict when the lid opens again before the supply is switched on', () => {
    const { state, effect } = runTo((s, e) => s.stepIndex > 3 && e?.kind === 'prepare-supply', {}, onTarget);
    expect(effect?.kind).toBe('prepare-supply');
    const now = advanceRun(state, { atMs, kind: 'lid', closed: false });
    expect(now.effects.map((e) => e.kind)).toEqual(['supply-off']);
  });
});

describe('stopping does not launder rejects', () => {
  const outside = planFor('CB1210').boardType.limits.tripVolts.max + 0.1;
  const untrimmed = (): Partial<RunPlan> => {
    const { sequence } = planFor('CB1210');
    return { sequence: { ...sequence, steps: sequence.steps.filter((s) => s.kind !== 'trim' && s.kind !== 'seal') } };
  };
  const stopAt = (until: Stage, startTripVolts: number) => {
    const before = runTo(until, untrimmed(), startTripVolts);
    const stopped = advanceRun(before.state, { atMs, kind: 'stop' });
    return resultOf(advanceRun(stopped.state, offAnswer(idOf(stopped.effects[0]))).state);
  };
  it('a run stopped after points outside the limits, with no trim to come, is failing when stopped', () => {
    expect(stopAt(inStep('verify'), outside)).toMatchObject({ verdict: 'no-verdict', failingWhenStopped: true });
  });
  it('a run stopped while its points are inside is not', () => {
    expect(stopAt(inStep('verify'), outside - 0.2)).toMatchObject({ failingWhenStopped: false });
  });
  it('a run stopped while trimming can still correct its points is not', () => {
    const before = runTo(
      (state, effect) => viewRun(state).screen.kind === 'trim' && effect?.kind === 'sense',
      {},
      outside,
    );
    const stopped = advanceRun(before.state, { atMs, kind: 'stop' });
    const over = advanceRun(stopped.state, offAnswer(idOf(stopped.effects[0])));
    expect(resultOf(over.state)).toMatchObject({ failingWhenStopped: false });
  });
  it('a run stopped after turning was found to change nothing is failing when stopped', () => {
    const noEffect: Stage = (state) => {
      const { screen } = viewRun(state);
      return screen.kind === 'trim' && screen.trim.finding === 'no-effect';
    };
    const before = runTo(noEffect, {}, outside + 0.3);
    const stopped = advanceRun(before.state, { atMs, kind: 'stop' });
    const over = advanceRun(stopped.state, offAnswer(idOf(stopped.effects[0])));
    expect(resultOf(over.state)).toMatchObject({ verdict: 'no-verdict', failingWhenStopped: true });
  });
  it('a reject that is decided stays one, whatever follows', () => {
    const plan = planFor('CB1210');
    const plant = new Plant({ boardType: plan.boardType, seed: 4, defect: 'supply-short' });
    plant.lidClosed = plant.boardPresent = true;
    let now = beginRun(plan, 0);
    while (now.state.phase.kind === 'steps') now = advanceRun(now.state, plant.perform(now.effects[0] as never));
    const off = idOf(now.effects[0]);
    now = advanceRun(now.state, { atMs, kind: 'lid', closed: false });
    now = advanceRun(now.state, { atMs, kind: 'stop' });
    now = advanceRun(now.state, offAnswer(off));
    expect(resultOf(now.state)).toMatchObject({ verdict: 'reject', rejectReason: 'supply-current-at-limit' });
  });
});

describe('the operator says that the screw will not turn', () => {
  it('which is a finding and rejects the board', () => {
    const before = runTo((state, effect) => viewRun(state).screen.kind === 'trim' && effect?.kind === 'sense');
    const now = advanceRun(before.state, { atMs, kind: 'will-not-turn' });
    const { state } = advanceRun(now.state, offAnswer(idOf(now.effects[0])));
    expect(resultOf(state)).toMatchObject({ verdict: 'reject', rejectReason: 'trim-will-not-turn' });
  });
});

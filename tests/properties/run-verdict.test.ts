import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decideVerdict, type StepVisit } from '@/lib/decision/decide-verdict';
import { requiredMeasurements } from '@/lib/decision/required-measurements';
import { advanceRun, beginRun, resultOf, type RunState } from '@/lib/run/run';
import type { RunEffect, RunEvent, RunPlan } from '@/lib/run/types';
import type { Sequence } from '@/lib/sequence/step';
import { viewRun } from '@/lib/run/view';
import { planFor } from '../lib/run/play-board';
import { Plant, seeded } from '../lib/run/plant';

/** What fate does to a run, decided before each answer. */
const fates = fc.record({
  seed: fc.integer({ min: 1, max: 1_000_000 }),
  code: fc.constantFrom('CB1210', 'CB0612'),
  hasController: fc.boolean(),
  trims: fc.boolean(),
  /** Chance in a thousand, at each turn, of each kind of mischief. */
  faultPerMille: fc.constantFrom(0, 0, 2, 20),
  actPerMille: fc.constantFrom(0, 0, 2, 20),
  strayPerMille: fc.constantFrom(0, 100, 500),
  wildPerMille: fc.constantFrom(0, 0, 20, 200),
  unconfirmed: fc.boolean(),
});
type Fate = typeof fates extends fc.Arbitrary<infer F> ? F : never;

const faultReasons = ['supply-fault', 'meter-fault', 'fixture-fault', 'link-lost', 'overvoltage-tripped'] as const;

interface Story {
  plan: RunPlan;
  state: RunState;
  effects: RunEffect[];
  events: RunEvent[];
}

function planOf(fate: Fate): RunPlan {
  const plan = planFor(fate.code, { hasController: fate.hasController });
  const drop = new Set<string>([
    ...(fate.trims ? [] : ['trim', 'seal']),
    ...(fate.hasController ? [] : ['ride-through']),
  ]);
  const steps = plan.sequence.steps.filter((step) => !drop.has(step.kind));
  return { ...plan, sequence: { ...plan.sequence, steps } };
}

/** Nobody turns the screw in these runs; after so long the operator says so. */
const patienceSenses = 100;

/** Tells a whole run with everything that may go wrong. Bounded: a run that does not end fails the test. */
function tell(fate: Fate): Story {
  const plan = planOf(fate);
  const random = seeded(fate.seed);
  const chance = (perMille: number) => random() * 1000 < perMille;
  const startTripVolts = fate.trims ? undefined : plan.boardType.limits.tripVolts.min + 0.1;
  const plant = new Plant({
    boardType: plan.boardType,
    seed: fate.seed,
    ...(startTripVolts ? { startTripVolts } : {}),
  });
  plant.lidClosed = plant.boardPresent = true;
  let { state, effects: pending } = beginRun(plan, plant.nowMs);
  const effects = [...pending];
  const events: RunEvent[] = [];
  const take = (event: RunEvent) => {
    events.push(event);
    const next = advanceRun(state, event);
    state = next.state;
    effects.push(...next.effects);
    if (next.effects.length > 0) pending = next.effects;
  };
  let senses = 0;
  for (let turn = 0; turn < 20_000 && !resultOf(state); turn++) {
    const atMs = plant.nowMs;
    if (chance(fate.strayPerMille)) take(stray(atMs, random, state));
    if (chance(fate.actPerMille)) take(act(atMs, random));
    const [effect] = pending;
    if (!effect || effect.kind === 'record-run') {
      take(operatorAt(state, atMs, plant));
      continue;
    }
    pending = [];
    const answer = plant.perform(effect);
    senses = effect.kind === 'sense' ? senses + 1 : 0;
    if (senses > patienceSenses) take({ atMs, kind: 'will-not-turn' });
    if (effect.kind === 'supply-off' && fate.unconfirmed && chance(500)) {
      take({ atMs: plant.nowMs, kind: 'supply-is-off', id: effect.id, confirmed: false });
    } else if (chance(fate.faultPerMille)) {
      const reason = faultReasons[Math.floor(random() * faultReasons.length)]!;
      take({ atMs: plant.nowMs, kind: 'fault', id: effect.id, reason, code: 'S-204', detail: 'no answer' });
    } else {
      take(chance(fate.wildPerMille) ? wild(answer, random) : answer);
    }
  }
  return { plan, state, effects, events };
}

/** An answer to something never asked, or long answered. */
function stray(atMs: number, random: () => number, state: RunState): RunEvent {
  const id = random() < 0.5 ? 0 : Math.floor(random() * state.nextId) - 1_000_000;
  const kinds: RunEvent[] = [
    { atMs, kind: 'probed', id, voltsBefore: null, volts: 11, output: 'on' },
    { atMs, kind: 'measured', id, volts: 3 },
    { atMs, kind: 'supply-is-off', id, confirmed: true, volts: 0, by: 'meter' },
    { atMs, kind: 'fault', id, reason: 'meter-fault', code: 'M-1', detail: 'late' },
    { atMs, kind: 'waited', id },
  ];
  return kinds[Math.floor(random() * kinds.length)]!;
}

function act(atMs: number, random: () => number): RunEvent {
  const kinds: RunEvent[] = [
    { atMs, kind: 'stop' },
    { atMs, kind: 'lid', closed: false },
    { atMs, kind: 'lid', closed: true },
    { atMs, kind: 'board', present: false },
    { atMs, kind: 'will-not-turn' },
    { atMs, kind: 'screw-found' },
    { atMs, kind: 'answer', ok: true },
    { atMs, kind: 'confirm', what: 'sealed' },
    { atMs, kind: 'bench-lost' },
    { atMs, kind: 'shutdown' },
    { atMs, kind: 'fault', id: null, reason: 'link-lost', code: 'L-1', detail: 'unplugged' },
  ];
  return kinds[Math.floor(random() * kinds.length)]!;
}

/** A reading that makes no sense. */
function wild(answer: RunEvent, random: () => number): RunEvent {
  const nonsense = [0, -1, 1e6, 15, 1e-9][Math.floor(random() * 5)]!;
  if (answer.kind === 'probed') return { ...answer, output: random() < 0.5 ? 'on' : 'off' };
  if (answer.kind === 'measured') return { ...answer, volts: nonsense };
  if (answer.kind === 'supply-measured') return { ...answer, amps: nonsense };
  if (answer.kind === 'pulsed') return { ...answer, seconds: nonsense };
  return answer;
}

/** What the operator does where the run waits for him; stops where nothing helps. */
function operatorAt(state: RunState, atMs: number, plant: Plant): RunEvent {
  const { screen } = viewRun(state);
  const { hasController } = state.plan;
  plant.nowMs += 100;
  if (screen.kind === 'operator-check') return { atMs, kind: 'answer', ok: true };
  if (screen.kind === 'seat') {
    return hasController
      ? { atMs, kind: 'lid', closed: (plant.lidClosed = plant.boardPresent = true) }
      : { atMs, kind: 'confirm', what: 'lid-and-board' };
  }
  if (screen.kind === 'seal') {
    const opening = screen.wants === 'open-lid';
    plant.lidClosed = !opening;
    if (hasController) return { atMs, kind: 'lid', closed: !opening };
    return { atMs, kind: 'confirm', what: opening ? 'lid-open' : 'lid-closed' };
  }
  return { atMs, kind: 'stop' };
}

describe('whatever happens to a run', () => {
  it('it ends, off before the record, silent after it, and passes only on whole verified evidence', () => {
    const verdicts = { pass: 0, reject: 0, 'no-verdict': 0 };
    fc.assert(
      fc.property(fates, (fate) => {
        const { plan, state, effects, events } = tell(fate);
        const result = resultOf(state);
        if (!result) throw new Error('The run does not end.');
        verdicts[result.verdict] += 1;

        expect(effects.filter((e) => e.kind === 'record-run')).toHaveLength(1);
        expect(effects.at(-1)!.kind).toBe('record-run');
        expect(effects.at(-2)!.kind).toBe('supply-off');
        const lastOff = events.findLast(
          (e) => e.kind === 'supply-is-off' && 'id' in e && e.id === (effects.at(-2) as { id: number }).id,
        );
        expect(result.supplyOff.confirmed).toBe(lastOff?.kind === 'supply-is-off' && lastOff.confirmed);

        const after: RunEvent = { atMs: 1e9, kind: 'stop' };
        expect(advanceRun(state, after)).toEqual({ state, effects: [] });
        for (const volts of effects.flatMap((e) => (e.kind === 'probe' || e.kind === 'supply-on' ? [e.volts] : []))) {
          expect(volts).toBeLessThanOrEqual(plan.boardType.absoluteMaximumVolts);
        }

        if (result.verdict === 'pass') {
          expect(result.supplyOff.confirmed).toBe(true);
          expect(result.measurements.every((m) => m.passed !== false)).toBe(true);
          for (const needed of requiredMeasurements(plan.sequence)) {
            expect(result.measurements).toContainEqual(expect.objectContaining({ ...needed, passed: true }));
          }
          expect(events.some((e) => e.kind === 'stop' || e.kind === 'bench-lost' || e.kind === 'shutdown')).toBe(false);
        }
        expect([result.rejectReason !== null, result.noVerdictReason !== null]).toEqual([
          result.verdict === 'reject',
          result.verdict === 'no-verdict',
        ]);
        if (result.verdict !== 'no-verdict') expect(result.failingWhenStopped).toBe(false);
      }),
      { numRuns: 60, seed: 20261201 },
    );
    // The fates are varied enough to say something: each verdict comes up.
    expect(Math.min(...Object.values(verdicts))).toBeGreaterThan(3);
  }, 120_000);

  it('the same events give the same run, and a copied state goes on alike', () => {
    fc.assert(
      fc.property(fates, (fate) => {
        const { plan, state, events } = tell(fate);
        let again = beginRun(plan, 1_000).state;
        events.forEach((event, index) => {
          again = advanceRun(index % 50 === 0 ? structuredClone(again) : again, event).state;
        });
        expect(resultOf(again)).toEqual(resultOf(state));
      }),
      { numRuns: 12, seed: 7 },
    );
  }, 120_000);

  it('answers to effects that are not outstanding change nothing', () => {
    const plan = planFor('CB1210');
    const { state } = beginRun(plan, 0);
    fc.assert(
      fc.property(fc.integer(), fc.integer({ min: 0, max: 1e6 }), (id, seed) => {
        fc.pre(id !== 1);
        const event = { ...stray(5, seeded(seed), state), id } as RunEvent;
        expect(advanceRun(state, event)).toEqual({ state, effects: [] });
      }),
    );
  });
});

/** Every step but the record gone through in order, each with the measurements that are its own. */
function straight({ steps }: Sequence, measurements: readonly { stepIndex: number }[]): StepVisit[] {
  return steps.slice(0, -1).map((_, stepIndex) => ({
    stepIndex,
    measured: measurements.filter((m) => m.stepIndex <= stepIndex).length,
    jumpedTo: null,
  }));
}

describe('the verdict', () => {
  const { sequence } = planFor('CB1210');
  const whole = requiredMeasurements(sequence)
    .sort((a, b) => a.stepIndex! - b.stepIndex!)
    .map((needed) => ({
      ...needed,
      stepIndex: needed.stepIndex!,
      value: 1,
      standardUncertainty: null,
      expandedUncertainty: null,
      min: null,
      max: null,
      guardedMin: null,
      guardedMax: null,
      passed: true as boolean | null,
      settles: null,
    }));
  const evidence = {
    ending: { kind: 'complete' } as const,
    sequence,
    path: straight(sequence, whole),
    measurements: whole,
    supplyOff: true,
  };

  it('is a pass for whole evidence', () => {
    expect(decideVerdict(evidence)).toEqual({ verdict: 'pass' });
  });
  it('is never a pass when any required measurement is missing, unjudged or failed', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: whole.length - 1 }), fc.constantFrom('missing', null, false), (at, how) => {
        const measurements =
          how === 'missing'
            ? whole.filter((_, i) => i !== at)
            : whole.map((m, i) => (i === at ? { ...m, passed: how as boolean | null } : m));
        const decision = decideVerdict({ ...evidence, measurements, path: straight(sequence, measurements) });
        expect(decision).toMatchObject({ kind: how === false ? 'reject' : 'no-verdict' });
      }),
    );
  });
  it('is never a pass before every step is done or while the supply is not confirmed off', () => {
    expect(decideVerdict({ ...evidence, path: evidence.path.slice(0, -1) })).toMatchObject({ kind: 'no-verdict' });
    expect(decideVerdict({ ...evidence, supplyOff: false })).toMatchObject({ reason: 'supply-fault' });
  });
  it('is never a pass for a sequence that verifies nothing', () => {
    const bare = { ...sequence, steps: sequence.steps.filter((s) => s.kind !== 'verify') };
    const decision = decideVerdict({ ...evidence, sequence: bare, path: straight(bare, whole) });
    expect(decision).toMatchObject({ kind: 'no-verdict' });
  });
});

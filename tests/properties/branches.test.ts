import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decideVerdict, type StepVisit } from '@/lib/decision/decide-verdict';
import { advanceRun, beginRun, resultOf, type RunState } from '@/lib/run/run';
import type { Measurement, RunEvent } from '@/lib/run/types';
import { viewRun } from '@/lib/run/view';
import type { Sequence, Step } from '@/lib/sequence/step';
import { kindOf } from '@/lib/steps/step-kinds';
import { changed } from '../lib/steps/change-steps';
import { Operator, planFor } from '../lib/run/play-board';
import { Plant } from '../lib/run/plant';

const demo = planFor('CB1210');
const quick = { wantedUncertaintyVolts: 0.003 };
const base = {
  ...demo,
  sequence: changed(changed(demo.sequence, 'verify', { ...quick, repeats: 2 }), 'find-points', quick),
};
const points = ['trip-volts', 'release-volts', 'hysteresis-volts'] as const;

const branchPlans = fc.array(
  fc.record({
    at: fc.nat(),
    goTo: fc.nat(),
    is: fc.constantFrom('below' as const, 'above' as const),
    value: fc.constantFrom(0, 10.7, 10.8, 99),
    mostTimes: fc.integer({ min: 1, max: 2 }),
    missing: fc.integer({ min: 0, max: 9 }).map((n) => n === 0),
  }),
  { maxLength: 3 },
);
const resting = fc.subarray(['reference', 'trim', 'seal', 'verify', 'output-levels', 'operator-check'] as const, {
  maxLength: 2,
});

/** The sequence of the demo with branches anywhere to anywhere, and some of its steps not run. */
function shuffled(
  branches: typeof branchPlans extends fc.Arbitrary<infer B> ? B : never,
  rest: readonly string[],
): Sequence {
  const steps: Step[] = base.sequence.steps.map((step) => ({ ...step, enabled: !rest.includes(step.kind) }));
  const ids = steps.map(({ id }) => id);
  branches.forEach(({ at, goTo, is, value, mostTimes, missing }, n) => {
    const target = missing ? 'gone' : ids[goTo % ids.length]!;
    const place = 2 + (at % (steps.length - 2));
    steps.splice(place, 0, {
      id: `b${n}`,
      name: '',
      enabled: true,
      kind: 'branch',
      quantity: 'trip-volts',
      is,
      value,
      goTo: target,
      mostTimes,
    });
  });
  return { ...base.sequence, steps };
}

/** What the run went through, seen from outside: each step with the measurements of that visit. */
interface Seen {
  step: Step;
  measurements: Measurement[];
}

function watch(sequence: Sequence, seed: number, startTripVolts: number, stopAtTurn: number | null) {
  const plan = { ...base, sequence };
  const plant = new Plant({ boardType: plan.boardType, seed, startTripVolts });
  const operator = new Operator(plant, plan, true);
  const seen: Seen[] = [];
  let { state, effects: pending } = beginRun(plan, plant.nowMs);
  const take = (event: RunEvent) => {
    const before = state;
    const next = advanceRun(state, event);
    state = next.state;
    note(before, state);
    if (next.effects.length > 0) pending = next.effects;
  };
  const note = (before: RunState, after: RunState) => {
    const step = sequence.steps[before.stepIndex]!;
    const made = after.facts.measurements.slice(before.facts.measurements.length);
    const last = seen.at(-1);
    const same = last && last.step === step && before.path.length === lastPath;
    if (same) last.measurements.push(...made);
    else seen.push({ step, measurements: [...made] });
    lastPath = before.path.length;
  };
  let lastPath = -1;
  for (let turn = 0; turn < 40_000 && !resultOf(state); turn++) {
    if (turn === stopAtTurn) take({ atMs: plant.nowMs, kind: 'stop' });
    const { screen } = viewRun(state);
    const [effect] = pending;
    pending = [];
    if (effect && effect.kind !== 'record-run') {
      const fromMs = plant.nowMs;
      const answer = plant.perform(effect);
      operator.turnDuring(plant.nowMs - fromMs, screen);
      take(answer);
    } else take(operator.act(screen) ?? { atMs: plant.nowMs, kind: 'stop' });
  }
  return { seen, result: resultOf(state)!, path: state.path };
}

/** The last verification seen after the screw was last touched has passed points. */
function isVerifiedLast(seen: readonly Seen[]): boolean {
  const touched = seen.findLastIndex(({ step }) => step.kind === 'trim' || step.kind === 'seal');
  return seen
    .slice(touched + 1)
    .some(
      ({ step, measurements }) =>
        step.kind === 'verify' &&
        points.every((quantity) =>
          measurements.some((m) => m.quantity === quantity && m.phase === 'verified' && m.passed === true),
        ),
    );
}

describe('whatever the branches of a sequence', () => {
  it('a board passes only with points verified after the screw was last touched, and every step of its way done', () => {
    const verdicts = { pass: 0, reject: 0, 'no-verdict': 0 };
    fc.assert(
      fc.property(
        branchPlans,
        resting,
        fc.integer({ min: 1, max: 1e6 }),
        fc.constantFrom(10.4, 10.8),
        fc.option(fc.integer({ min: 0, max: 1_200 }), { freq: 3 }),
        (branches, rest, seed, startTripVolts, stopAtTurn) => {
          const sequence = shuffled(branches, rest);
          const { seen, result, path } = watch(sequence, seed, startTripVolts, stopAtTurn);
          verdicts[result.verdict] += 1;
          for (const { id, kind } of sequence.steps) {
            const most = kind === 'branch' ? Infinity : 3 ** 3 + 1;
            expect(path.filter(({ stepIndex }) => sequence.steps[stepIndex]!.id === id).length).toBeLessThanOrEqual(
              most,
            );
          }
          expect(path.every(({ stepIndex }) => sequence.steps[stepIndex]!.enabled)).toBe(true);
          if (result.verdict !== 'pass') return;
          expect(isVerifiedLast(seen)).toBe(true);
          for (const { step, measurements } of seen.filter(({ step: { kind } }) => kind !== 'record')) {
            for (const required of kindOf(step).required(step)) {
              expect(measurements).toContainEqual(expect.objectContaining({ ...required, passed: true }));
            }
          }
        },
      ),
      { numRuns: 30, seed: 20261202 },
    );
    expect(Math.min(verdicts.pass, verdicts['no-verdict'])).toBeGreaterThan(3);
  }, 120_000);
});

const walks = fc.record({
  branches: branchPlans,
  rest: resting,
  turns: fc.array(fc.boolean(), { minLength: 12, maxLength: 12 }),
  spoil: fc.constantFrom('nothing', 'drop-measurement', 'drop-visit', 'swap', 'early'),
  where: fc.nat(),
});

/** A walk through the sequence as its branches allow, with all that each visit measures. */
function walk({ steps }: Sequence, turns: readonly boolean[]): { path: StepVisit[]; measurements: Measurement[] } {
  const path: StepVisit[] = [];
  const measurements: Measurement[] = [];
  let at = steps.findIndex(({ enabled }) => enabled);
  for (let n = 0; steps[at] && steps[at]!.kind !== 'record' && n < 60; n++) {
    const step = steps[at]!;
    const needed = [
      ...kindOf(step).required(step),
      ...(step.kind === 'verify' ? points.map((quantity) => ({ quantity, phase: 'verified' as const })) : []),
    ];
    measurements.push(...needed.map((each) => ({ ...blank, ...each, stepIndex: at })));
    const goes = step.kind === 'branch' && turns[n % turns.length]!;
    const to = goes ? steps.findIndex(({ id, enabled }) => id === step.goTo && enabled) : -1;
    const jumpedTo = to >= 0 ? to : null;
    path.push({ stepIndex: at, measured: measurements.length, jumpedTo });
    at = jumpedTo ?? steps.findIndex(({ enabled }, i) => i > at && enabled);
  }
  return { path, measurements };
}
const blank = {
  value: 1,
  standardUncertainty: null,
  expandedUncertainty: null,
  min: null,
  max: null,
  guardedMin: null,
  guardedMax: null,
  passed: true,
  settles: null,
};

function spoiled(
  { path, measurements }: ReturnType<typeof walk>,
  spoil: string,
  where: number,
): ReturnType<typeof walk> {
  const n = path.length === 0 ? 0 : where % path.length;
  switch (spoil) {
    case 'drop-measurement': {
      const gone = where % Math.max(1, measurements.length);
      return {
        path: path.map((v) => ({ ...v, measured: v.measured > gone ? v.measured - 1 : v.measured })),
        measurements: measurements.filter((_, i) => i !== gone),
      };
    }
    case 'drop-visit':
      return { path: path.filter((_, i) => i !== n), measurements };
    case 'swap':
      return { path: path.map((v, i) => (i === n ? path[0]! : v)), measurements };
    case 'early':
      return { path: path.slice(0, n), measurements };
    default:
      return { path, measurements };
  }
}

/** From the first step that is run to the record, each followed by the next or by where its branch leads. */
function isLegal({ steps }: Sequence, path: readonly StepVisit[]): boolean {
  const running = steps.filter(({ enabled }) => enabled);
  const places = [...path.map(({ stepIndex }) => steps[stepIndex]!), steps.at(-1)!];
  return places.every((step, n) => {
    const from = n === 0 ? null : places[n - 1]!;
    if (!from) return step === running[0];
    if (path[n - 1]!.jumpedTo !== null) return from.kind === 'branch' && from.goTo === step.id;
    return step === running[running.indexOf(from) + 1];
  });
}

describe('the verdict of a way through a sequence', () => {
  it('is a pass for a whole way with verified points at its end, and for nothing less', () => {
    const counts = { pass: 0, none: 0 };
    fc.assert(
      fc.property(walks, ({ branches, rest, turns, spoil, where }) => {
        const sequence = shuffled(branches, rest);
        const { path, measurements } = spoiled(walk(sequence, turns), spoil, where);
        const decision = decideVerdict({ ending: { kind: 'complete' }, sequence, path, measurements, supplyOff: true });
        const seen = path.map(({ stepIndex, measured }, n) => ({
          step: sequence.steps[stepIndex]!,
          measurements: measurements
            .slice(path[n - 1]?.measured ?? 0, measured)
            .filter((m) => m.stepIndex === stepIndex),
        }));
        const measuredAll = seen.every(({ step, measurements: own }) =>
          kindOf(step)
            .required(step)
            .every(({ quantity, phase }) => own.some((m) => m.quantity === quantity && m.phase === phase)),
        );
        const good = isLegal(sequence, path) && measuredAll && isVerifiedLast(seen);
        counts[good ? 'pass' : 'none'] += 1;
        expect('verdict' in decision).toBe(good);
      }),
      { numRuns: 2_000, seed: 5 },
    );
    expect(Math.min(counts.pass, counts.none)).toBeGreaterThan(200);
  });
});

import type { Bins, DryRunPair, DryRunSide, Share } from '../contracts/dry-run';
import type { RejectReason } from '../run/types';
import { newcombePaired } from '../statistics/proportions/newcombe-paired';
import { wilson } from '../statistics/proportions/wilson';
import type { DryBoardOutcome } from './outcome';

/** Outcomes by board; a board that is not done yet is absent. */
export type Outcomes = readonly (DryBoardOutcome | undefined)[];

/** Boards between two points of the chart of how the yield settles; more of them where that makes over 100 points. */
const settlingEvery = 20;
const mostPoints = 100;
/** Width of a bin of the distributions, volts. */
const binVolts = 0.005;

export function shareOf(count: number, of: number): Share {
  return { count, of, ...(of === 0 ? { low: 0, high: 1 } : wilson(count, of)) };
}

/** What one sequence did with the boards that are done. Runs without a verdict are in no yield. */
export function summariseSide(outcomes: Outcomes): DryRunSide {
  const done = outcomes.filter((each) => each !== undefined);
  const judged = done.filter(({ verdict }) => verdict !== 'no-verdict');
  const passed = judged.filter(({ verdict }) => verdict === 'pass');
  const rejected = judged.filter(({ verdict }) => verdict === 'reject');
  const good = judged.filter((each) => each.good).length;
  const mean = (values: number[]) => (values.length === 0 ? 0 : values.reduce((sum, v) => sum + v, 0) / values.length);
  return {
    firstPass: shareOf(passed.length, judged.length),
    reasons: reasonsOf(rejected),
    lostAt: lostAt(done),
    noVerdict: done.length - judged.length,
    trip: binsOf(done.map((each) => each.tripVolts)),
    release: binsOf(done.map((each) => each.releaseVolts)),
    stationSeconds: mean(passed.map(({ seconds, personSeconds }) => seconds - personSeconds)),
    boardSeconds: mean(passed.map(({ seconds }) => seconds)),
    falseRejects: shareOf(rejected.filter((each) => each.good).length, good),
    falseAccepts: shareOf(passed.filter((each) => !each.good).length, judged.length - good),
    settling: settlingOf(outcomes),
  };
}

/** Both sequences on the boards that both are done with. */
export function summarisePair(draft: Outcomes, released: Outcomes): DryRunPair {
  const counts = { both: 0, onlyA: 0, onlyB: 0, neither: 0 };
  draft.forEach((a, i) => {
    const b = released[i];
    if (!a || !b || a.verdict === 'no-verdict' || b.verdict === 'no-verdict') return;
    const [ofA, ofB] = [a.verdict === 'pass', b.verdict === 'pass'];
    counts[ofA ? (ofB ? 'both' : 'onlyA') : ofB ? 'onlyB' : 'neither']++;
  });
  const any = counts.both + counts.onlyA + counts.onlyB + counts.neither > 0;
  const { difference, low, high } = any ? newcombePaired(counts) : { difference: 0, low: -1, high: 1 };
  return { onlyDraft: counts.onlyA, onlyReleased: counts.onlyB, difference: { value: difference, low, high } };
}

function reasonsOf(rejected: DryBoardOutcome[]): DryRunSide['reasons'] {
  const counts = new Map<string, { reason: RejectReason; stepId: string | null; boards: number }>();
  for (const { reason, stepId } of rejected) {
    if (reason === null) continue;
    const key = `${reason}:${stepId}`;
    const known = counts.get(key) ?? { reason, stepId, boards: 0 };
    known.boards++;
    counts.set(key, known);
  }
  return [...counts.values()].sort((a, b) => b.boards - a.boards || (a.reason < b.reason ? -1 : 1));
}

function lostAt(done: DryBoardOutcome[]): Record<string, number> {
  const counts: Record<string, number> = {};
  for (const { stepId } of done) if (stepId !== null) counts[stepId] = (counts[stepId] ?? 0) + 1;
  return counts;
}

function binsOf(values: (number | null)[]): Bins {
  const indexes = values.filter((value) => value !== null).map((value) => Math.floor(value / binVolts + 1e-9));
  if (indexes.length === 0) return { from: 0, width: binVolts, counts: [] };
  const first = Math.min(...indexes);
  const counts = new Array<number>(Math.max(...indexes) - first + 1).fill(0);
  for (const index of indexes) counts[index - first]!++;
  return { from: first * binVolts, width: binVolts, counts };
}

/** In the order of the boards, as far as every board before is done. */
function settlingOf(outcomes: Outcomes): DryRunSide['settling'] {
  const every = settlingEvery * Math.max(1, Math.ceil(outcomes.length / settlingEvery / mostPoints));
  const points: DryRunSide['settling'] = [];
  let passed = 0;
  let judged = 0;
  for (let i = 0; i < outcomes.length; i++) {
    const outcome = outcomes[i];
    if (!outcome) break;
    if (outcome.verdict !== 'no-verdict') judged++;
    if (outcome.verdict === 'pass') passed++;
    const isPoint = (i + 1) % every === 0 || i + 1 === outcomes.length;
    if (isPoint && judged > 0) points.push({ boards: i + 1, share: passed / judged, ...wilson(passed, judged) });
  }
  return points;
}

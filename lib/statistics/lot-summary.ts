import { boardStanding, type BoardRecord, type BoardStanding } from '../decision/board-standing';
import type { RejectReason, Verdict } from '../run/types';

/** A board of a lot with its record; runs oldest first. */
export interface LotBoard extends BoardRecord {
  serial: string;
  runs: (BoardRecord['runs'][number] & { rejectReason: RejectReason | null })[];
}

/** How a rejected board stands: see the Pareto of the design. */
export type RejectDecision = 'undecided' | 'rework' | 'scrap' | 'other';

export interface ReasonCount {
  reason: RejectReason;
  /** Boards whose last verdict is this reject. */
  boards: number;
  decisions: Record<RejectDecision, number>;
}

export interface LotSummary {
  size: number;
  /** Boards with at least one verdict. */
  tested: number;
  /** First run with a verdict passed. */
  passedFirst: number;
  /** Last verdict is a pass, though the first was a reject. */
  passedLater: number;
  /** Last verdict is a reject. */
  rejected: number;
  /** Rejected or stopped boards that wait for somebody's decision. */
  undecided: number;
  inTest: number;
  /** Runs without a verdict; they count against nobody's yield. */
  runsWithoutVerdict: number;
  /** Share of tested boards, 0 to 1; null before the first verdict. */
  firstPassYield: number | null;
  finalYield: number | null;
  reasons: ReasonCount[];
  /** One character a board in lot order; see LotStrip. */
  marks: string;
}

const withVerdict = (board: LotBoard) => board.runs.filter((run) => run.verdict === 'pass' || run.verdict === 'reject');
export const firstVerdict = (board: LotBoard): Verdict | null => withVerdict(board)[0]?.verdict ?? null;
export const lastVerdict = (board: LotBoard): Verdict | null => withVerdict(board).at(-1)?.verdict ?? null;

/** Mark of the lot rule: `.` ahead, P pass, W pass on a later attempt, R reject, N no verdict, C current. */
export function boardMark(board: LotBoard): string {
  if (board.runs.some((run) => run.verdict === null)) return 'C';
  const last = lastVerdict(board);
  if (last === 'pass') return firstVerdict(board) === 'pass' ? 'P' : 'W';
  if (last === 'reject') return 'R';
  return board.runs.length > 0 ? 'N' : '.';
}

function decisionOf(standing: BoardStanding): RejectDecision {
  if (standing.kind === 'scrapped') return 'scrap';
  if (standing.kind === 'may-be-tested' || standing.kind === 'in-test' || standing.kind === 'attempts-used')
    return 'rework';
  return standing.kind === 'used-as-is' || standing.kind === 'returned' ? 'other' : 'undecided';
}

const needsSomebody = (standing: BoardStanding) =>
  standing.kind === 'needs-disposition' || standing.kind === 'waits-for-quality';

/**
 * Counts of a lot. First-pass yield counts the first run with a verdict, final yield the last one (domain, section 4); boards
 * without a verdict are in neither.
 */
export function summariseLot(boards: readonly LotBoard[]): LotSummary {
  const summary: LotSummary = {
    size: boards.length,
    tested: 0,
    passedFirst: 0,
    passedLater: 0,
    rejected: 0,
    undecided: 0,
    inTest: 0,
    runsWithoutVerdict: 0,
    firstPassYield: null,
    finalYield: null,
    reasons: [],
    marks: boards.map(boardMark).join(''),
  };
  let passedLast = 0;
  const reasons = new Map<RejectReason, ReasonCount>();
  for (const board of boards) {
    const standing = boardStanding(board);
    const first = firstVerdict(board);
    const last = lastVerdict(board);
    if (first) summary.tested++;
    if (first === 'pass') summary.passedFirst++;
    if (last === 'pass') passedLast++;
    if (last === 'pass' && first !== 'pass') summary.passedLater++;
    if (standing.kind === 'in-test') summary.inTest++;
    if (needsSomebody(standing)) summary.undecided++;
    summary.runsWithoutVerdict += board.runs.filter((run) => run.verdict === 'no-verdict').length;
    if (last !== 'reject') continue;
    summary.rejected++;
    const reason = withVerdict(board).at(-1)?.rejectReason;
    if (!reason) continue;
    const count = reasons.get(reason) ?? {
      reason,
      boards: 0,
      decisions: { undecided: 0, rework: 0, scrap: 0, other: 0 },
    };
    count.boards++;
    count.decisions[decisionOf(standing)]++;
    reasons.set(reason, count);
  }
  if (summary.tested > 0) {
    summary.firstPassYield = summary.passedFirst / summary.tested;
    summary.finalYield = passedLast / summary.tested;
  }
  summary.reasons = [...reasons.values()].sort((a, b) => b.boards - a.boards || a.reason.localeCompare(b.reason));
  return summary;
}

import { boardStanding, type BoardRecord, type BoardStanding } from '../decision/board-standing';

const finished: BoardStanding['kind'][] = ['passed', 'used-as-is', 'scrapped', 'returned'];

/** Whether a certificate covers the board: it passed last, or is used as it is by a concession that both sides signed. */
export function isCertifiable(board: BoardRecord): boolean {
  const { kind } = boardStanding(board);
  return kind === 'passed' || kind === 'used-as-is';
}

export type LotCertificateProblem = 'lot-not-complete' | 'nothing-passed';

/** Why a lot has no certificate yet; null where it may have one. A lot is complete when nothing is left to test or decide. */
export function lotCertificateProblem(
  state: 'open' | 'paused' | 'closed',
  boards: readonly BoardRecord[],
): LotCertificateProblem | null {
  const complete = boards.every((board) => finished.includes(boardStanding(board).kind));
  if (state !== 'closed' && !complete) return 'lot-not-complete';
  return boards.some(isCertifiable) ? null : 'nothing-passed';
}

import { countLotsByBoardType, listAllBoardTypeRevisions } from '@/db/queries/board-type-revisions';
import type { BoardType } from '@/lib/contracts/board-type';
import { database } from '@/server/postgres';

export interface BoardTypeListRow {
  code: string;
  name: string;
  /** Of the revision in use, else of the newest. */
  limits: BoardType['limits'];
  /** Null: none is approved yet. */
  inUse: number | null;
  draft: { number: number; state: 'draft' | 'submitted'; madeBy: string } | null;
  lots: { all: number; open: number };
}

export async function listBoardTypeRows(): Promise<BoardTypeListRow[]> {
  const db = database();
  const [revisions, lots] = await Promise.all([listAllBoardTypeRevisions(db), countLotsByBoardType(db)]);
  const codes = [...new Set(revisions.map(({ code }) => code))];
  return codes.map((code) => {
    const own = revisions.filter((each) => each.code === code);
    const approved = own.find(({ revision }) => revision.status === 'approved');
    const standing = own.find(({ revision: { status } }) => status === 'draft' || status === 'submitted');
    const shown = (approved ?? standing ?? own[0]!).revision;
    return {
      code,
      name: shown.specification.name,
      limits: shown.specification.limits,
      inUse: approved?.revision.number ?? null,
      draft: standing
        ? {
            number: standing.revision.number,
            state: standing.revision.status as 'draft' | 'submitted',
            madeBy: standing.madeByName,
          }
        : null,
      lots: lots.get(shown.boardTypeId) ?? { all: 0, open: 0 },
    };
  });
}

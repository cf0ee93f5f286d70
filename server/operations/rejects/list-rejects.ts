import { listBoardTypeCodes } from '@/db/queries/board-type-revisions';
import { listStationCodes } from '@/db/queries/lots';
import { listFailedMeasurements, listWaitingBoards, listWaitingConcessions } from '@/db/queries/rejects';
import { listUnitRecordsById } from '@/db/queries/unit-records';
import { rejectsPerPage, type RejectFilter, type RejectPage, type RejectRow } from '@/lib/contracts/reject-list';
import type { ConcessionSide } from '@/lib/decision/concession-sides';
import { decidableKinds } from '@/lib/decision/disposition-problem';
import { database } from '@/server/postgres';

/** One page of the boards that wait for a decision or a second signature, across lots. */
export async function listRejects(filter: RejectFilter, perPage = rejectsPerPage): Promise<RejectPage> {
  const db = database();
  const { boards, total } = await listWaitingBoards(db, filter, perPage);
  // Past the end, after boards were decided: the first page has the total.
  if (boards.length === 0 && filter.page > 1) return listRejects({ ...filter, page: 1 }, perPage);
  const runIds = boards.map((board) => board.runId);
  const unitIds = boards.map((board) => board.unitId);
  const [records, failed, concessions] = await Promise.all([
    listUnitRecordsById(db, unitIds),
    listFailedMeasurements(db, runIds),
    listWaitingConcessions(db, runIds),
  ]);
  const recordOf = new Map(records.map((record) => [record.unitId, record]));
  const concessionOf = new Map(concessions.map((each) => [each.runId, each]));
  const rows = boards.map(({ endedAt, ...board }) => {
    const concession = concessionOf.get(board.runId);
    return {
      ...board,
      endedIso: endedAt.toISOString(),
      measured: measuredFor(board, failed),
      decidable: decidableKinds(recordOf.get(board.unitId)!),
      concession: concession
        ? { byName: concession.byName, sides: (concession.content.sides ?? []) as ConcessionSide[] }
        : null,
    };
  });
  return { rows, total, page: filter.page };
}

/** Of what a run measured outside its limits, the quantity that its reason speaks of, or else the first of its last step. */
function measuredFor(
  { runId, rejectReason }: { runId: string; rejectReason: string | null },
  failed: Awaited<ReturnType<typeof listFailedMeasurements>>,
): RejectRow['measured'] {
  const own = failed.filter((each) => each.runId === runId);
  const spokenOf = own.find(({ quantity }) => rejectReason?.split('-')[0] === quantity.split('-')[0]);
  const shown = spokenOf ?? own[0];
  if (!shown) return null;
  const { quantity, value, min, max } = shown;
  return { quantity, value, min, max };
}

/** What the list can be narrowed to. */
export async function listRejectChoices(): Promise<{ boardTypes: string[]; stations: string[] }> {
  const db = database();
  const [boardTypes, stations] = await Promise.all([listBoardTypeCodes(db), listStationCodes(db)]);
  return { boardTypes, stations: stations.map(({ code }) => code) };
}

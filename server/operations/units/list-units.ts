import { listStationCodes } from '@/db/queries/lots';
import { listUnitRecordsById } from '@/db/queries/unit-records';
import { listRecentRuns, type RecentRun } from '@/db/queries/units';
import { listUnitsAwaitingDecision } from '@/db/queries/units-decisions';
import { boardStanding, type BoardStanding } from '@/lib/decision/board-standing';
import type { RejectReason, Verdict } from '@/lib/run/types';
import { database } from '@/server/postgres';

/** One row of the list of boards. */
export interface UnitListRow {
  serial: string;
  boardTypeCode: string;
  lotCode: string;
  verdict: Verdict;
  rejectReason: RejectReason | null;
  attempt: number;
  stationCode: string;
  endedAtIso: string;
  standing: BoardStanding['kind'] | null;
}

const most = 500;

/** Runs that ended, newest first, and where boards were tested. */
export async function listUnitsForDesk(filter: {
  verdict: Verdict | null;
  stationCode: string | null;
}): Promise<{ rows: UnitListRow[]; stations: { code: string; name: string }[] }> {
  const db = database();
  const [runs, stations] = await Promise.all([
    listRecentRuns(db, { ...filter, unitIds: null, most }),
    listStationCodes(db),
  ]);
  return { rows: runs.map((run) => rowOf(run, null)), stations };
}

/** Boards of which quality must decide: rejected, stopped while failing, or three times without a verdict. */
export async function listUndecidedUnits(): Promise<UnitListRow[]> {
  const db = database();
  const records = await listUnitRecordsById(db, await listUnitsAwaitingDecision(db, most));
  const undecided = new Map(
    records
      .map((record) => [record.unitId, boardStanding(record).kind] as const)
      .filter(([, kind]) => kind === 'needs-disposition' || kind === 'waits-for-quality'),
  );
  if (undecided.size === 0) return [];
  const runs = await listRecentRuns(db, { verdict: null, stationCode: null, unitIds: [...undecided.keys()], most });
  // The newest run of each board stands for it.
  const newest = runs.filter((run, i) => runs.findIndex((other) => other.unitId === run.unitId) === i);
  return newest.map((run) => rowOf(run, undecided.get(run.unitId)!));
}

function rowOf({ endedAt, unitId: _unitId, ...run }: RecentRun, standing: UnitListRow['standing']): UnitListRow {
  return { ...run, endedAtIso: endedAt.toISOString(), standing };
}

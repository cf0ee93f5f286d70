import { listStationCodes } from '@/db/queries/lots';
import { listRecentRuns, type RecentRun } from '@/db/queries/units';
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
}

const most = 500;

/** Runs that ended, newest first, and where boards were tested. */
export async function listUnitsForDesk(filter: {
  verdict: Verdict | null;
  stationCode: string | null;
}): Promise<{ rows: UnitListRow[]; stations: { code: string; name: string }[] }> {
  const db = database();
  const [runs, stations] = await Promise.all([listRecentRuns(db, { ...filter, most }), listStationCodes(db)]);
  return { rows: runs.map(rowOf), stations };
}

function rowOf({ endedAt, ...run }: RecentRun): UnitListRow {
  return { ...run, endedAtIso: endedAt.toISOString() };
}

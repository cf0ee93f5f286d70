import { listInstruments } from '@/db/queries/engineering-instruments';
import { listCommissionings, listDailyChecks, listReferenceBoards } from '@/db/queries/engineering-references';
import { listBenches } from '@/db/queries/station-benches';
import type { StationPage } from '@/lib/contracts/station-overview';
import { database } from '@/server/postgres';
import { admitBench } from '../bench/read-standing';
import { readStationRow, seeStations } from './read-stations';

/** One station with its due dates, daily checks and commissionings, or null when there is none of that code. */
export async function readStationPage(code: string): Promise<StationPage | null> {
  const db = database();
  const bench = (await listBenches(db)).find((each) => each.code === code);
  if (!bench) return null;
  const see = await seeStations(db);
  const [row, { readiness }, instruments, checks, commissionings, references] = await Promise.all([
    readStationRow(db, bench, see(bench)),
    admitBench(db, bench, null, null),
    listInstruments(db),
    listDailyChecks(db, bench.id, 60),
    listCommissionings(db, bench.id, 30),
    listReferenceBoards(db),
  ]);
  return {
    ...row,
    readiness,
    instruments: instruments
      .filter((each) => each.stationId === bench.id && each.retiredAt === null)
      .map(({ id, code: sticker, kind, calibratedOn, dueOn, certificateNumber }) => ({
        id,
        code: sticker,
        kind,
        calibratedOn,
        dueOn,
        certificateNumber,
      })),
    dailyChecks: checks.map(({ at, runId, ...check }) => ({
      ...check,
      atIso: at.toISOString(),
      atBench: runId !== null,
    })),
    commissionings: commissionings.map(({ at, validUntil, ...each }) => ({
      ...each,
      atIso: at.toISOString(),
      validUntilIso: validUntil.toISOString(),
    })),
    references: references
      .filter((each) => each.retiredAt === null)
      .map(({ id, code: sticker }) => ({ id, code: sticker })),
  };
}

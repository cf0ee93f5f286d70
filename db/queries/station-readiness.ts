import { and, desc, eq, isNull, max } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { boardTypes } from '@/db/schema/board-types';
import { calibrations } from '@/db/schema/calibrations';
import { commissionings } from '@/db/schema/commissionings';
import { dailyChecks } from '@/db/schema/daily-checks';
import { instruments } from '@/db/schema/instruments';
import { trainings } from '@/db/schema/trainings';
import type { InstrumentKind } from '@/lib/contracts/stored-states';
import type { InstrumentFacts, StationFacts } from '@/lib/run/admit-station';

type Reader = Database | Transaction;

export type Commissioning = typeof commissionings.$inferSelect;

/** The newest; it may have expired. */
export async function findCommissioning(db: Reader, stationId: string): Promise<Commissioning | null> {
  const [row] = await db
    .select()
    .from(commissionings)
    .where(eq(commissionings.stationId, stationId))
    .orderBy(desc(commissionings.at))
    .limit(1);
  return row ?? null;
}

export async function findDailyCheck(db: Reader, stationId: string): Promise<typeof dailyChecks.$inferSelect | null> {
  const [row] = await db
    .select()
    .from(dailyChecks)
    .where(eq(dailyChecks.stationId, stationId))
    .orderBy(desc(dailyChecks.at))
    .limit(1);
  return row ?? null;
}

/** What is on record of a station; `boardTypeId` or `accountId` null: training is not asked for. */
export async function readStationFacts(
  db: Reader,
  station: { id: string },
  of: { boardTypeId: string | null; accountId: string | null },
): Promise<Pick<StationFacts, 'meter' | 'supply' | 'dailyCheck' | 'commissioning' | 'training'>> {
  const [meter, supply, check, commissioning, training] = await Promise.all([
    findInstrument(db, station.id, 'multimeter'),
    findInstrument(db, station.id, 'supply'),
    findDailyCheck(db, station.id),
    findCommissioning(db, station.id),
    of.boardTypeId && of.accountId ? findTraining(db, of.accountId, of.boardTypeId) : null,
  ]);
  return {
    meter,
    supply,
    dailyCheck: check && { atIso: check.at.toISOString(), validHours: check.validHours, passed: check.passed },
    commissioning: commissioning && {
      atIso: commissioning.at.toISOString(),
      validUntilIso: commissioning.validUntil.toISOString(),
      overshoot: commissioning.overshoot,
    },
    training,
  };
}

/** The instrument standing on the station, with its newest certificate. It may be used to the end of the day of `dueOn`. */
async function findInstrument(db: Reader, stationId: string, kind: InstrumentKind): Promise<InstrumentFacts> {
  const [row] = await db
    .select({ code: instruments.code, calibratedOn: calibrations.calibratedOn, dueOn: calibrations.dueOn })
    .from(instruments)
    .leftJoin(calibrations, eq(calibrations.instrumentId, instruments.id))
    .where(and(eq(instruments.stationId, stationId), eq(instruments.kind, kind), isNull(instruments.retiredAt)))
    .orderBy(desc(calibrations.calibratedOn))
    .limit(1);
  return {
    code: row?.code ?? '',
    calibratedIso: row?.calibratedOn ? new Date(`${row.calibratedOn}T00:00:00`).toISOString() : null,
    validUntilIso: row?.dueOn ? endOfDay(row.dueOn) : null,
  };
}

/** Midnight after the day, in the time of the place where the server stands. */
function endOfDay(day: string): string {
  const date = new Date(`${day}T00:00:00`);
  date.setDate(date.getDate() + 1);
  return date.toISOString();
}

async function findTraining(db: Reader, accountId: string, boardTypeId: string) {
  const [type] = await db.select({ code: boardTypes.code }).from(boardTypes).where(eq(boardTypes.id, boardTypeId));
  const [latest] = await db
    .select({ until: max(trainings.validUntil) })
    .from(trainings)
    .where(and(eq(trainings.accountId, accountId), eq(trainings.boardTypeId, boardTypeId)));
  return { boardTypeCode: type?.code ?? '', validUntilIso: latest?.until?.toISOString() ?? null };
}

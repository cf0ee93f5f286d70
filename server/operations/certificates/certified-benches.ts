import { listChanges, listInstrumentHistories } from '@/db/queries/certified-runs';
import type { Database, Transaction } from '@/db/client';
import type { CertifiedBench, CertifiedInstrument } from '@/lib/contracts/certificate';
import { valueAt } from '@/lib/trail/value-at';

interface RunAtBench {
  stationId: string;
  stationCode: string;
  /** Now. */
  fixture: string;
  endedAt: Date | null;
}

/**
 * Tells what stood at a station when a run ended: fixture and instruments by the trail of their changes, each instrument with the
 * calibration that counted on that day.
 */
export async function readBenchHistory(db: Database | Transaction): Promise<(run: RunAtBench) => CertifiedBench> {
  const [instruments, stationChanges] = await Promise.all([listInstrumentHistories(db), listChanges(db, 'station')]);
  return ({ stationId, stationCode, fixture, endedAt }) => {
    const at = endedAt!.toISOString();
    const changes = stationChanges.filter(({ entityId }) => entityId === stationId);
    return {
      stationCode,
      fixture: valueAt(changes, 'fixture', at, fixture),
      instruments: instruments
        .filter((instrument) => valueAt(instrument.changes, 'stationId', at, instrument.stationId) === stationId)
        .map((instrument) => certified(instrument, at.slice(0, 10))),
    };
  };
}

type History = Awaited<ReturnType<typeof listInstrumentHistories>>[number];

function certified({ kind, code, expectedIdentity, calibrations }: History, day: string): CertifiedInstrument {
  const counted = calibrations.find(({ calibratedOn }) => calibratedOn <= day);
  return {
    role: kind,
    code,
    // *IDN? answers maker, model, serial number, firmware.
    serial: expectedIdentity?.split(',')[2]?.trim() || null,
    calibratedOn: counted?.calibratedOn ?? null,
    calibratedUntil: counted?.dueOn ?? null,
    certificateNumber: counted?.certificateNumber ?? null,
  };
}

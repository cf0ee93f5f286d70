import type { Database } from '@/db/client';
import { findAccount } from '@/db/queries/accounts';
import { findOpenOffer, type OpenOffer } from '@/db/queries/engineering-offers';
import { findRunAwaitingBin, findNewestLabel } from '@/db/queries/runs-bench';
import { listOpenSessions } from '@/db/queries/sessions';
import { listBenches, type BenchRow } from '@/db/queries/station-benches';
import { findStationCall } from '@/db/queries/station-calls';
import { findBenchLot, type BenchLot } from '@/db/queries/station-lots';
import { findCommissioning, readStationFacts } from '@/db/queries/station-readiness';
import { listOpenRuns } from '@/db/queries/runs-open';
import { mayDo } from '@/lib/access/permissions';
import type { BenchPlace, PendingBin, Standing } from '@/lib/bench/types';
import { linkHasController } from '@/lib/contracts/station-link';
import { admitStation } from '@/lib/run/admit-station';
import { checkSequence } from '@/lib/sequence/check-sequence';
import type { StationKind } from '@/lib/sequence/station-kind';
import { stationKindOf } from '../engineering/station-kind';
import { readLotStrip } from '../runs/lot-strip';
import { nextRunOf, trialOfferOf } from './next-run';

/** Where a station stands: what must hold before it may test, its lot, its call, its label and a bin that waits. */
export async function readStanding(
  db: Database,
  bench: BenchRow,
  who: BenchPlace,
): Promise<{ standing: Standing; pendingBin: PendingBin | null }> {
  const lot = who.lotId ? await findBenchLot(db, { lotId: who.lotId }) : null;
  const offer = await findOpenOffer(db, bench.id);
  const trial = offer && offer.id === who.offerId ? offer : null;
  const [admission, sessions, strip, call, label, awaiting] = await Promise.all([
    trial ? admitTrial(db, bench, who.accountId, trial) : admitBench(db, bench, who.accountId, lot),
    who.sessionId ? listOpenSessions(db, [who.sessionId]) : [],
    lot ? readLotStrip(db, lot) : null,
    findStationCall(db, bench.id),
    who.serial ? findNewestLabel(db, who.serial) : null,
    findRunAwaitingBin(db, bench.id),
  ]);
  const otherStation =
    admission.reasons.length > 0 && !trial ? await findFreeStation(db, bench, who.accountId, lot) : null;
  const standing: Standing = {
    ...admission,
    otherStation,
    signedIn: sessions.length > 0,
    lot: strip,
    next: lot && nextRunOf(lot),
    offer: offer && trialOfferOf(offer),
    call: call && { sinceIso: call.at.toISOString(), acknowledgedBy: call.acknowledgedByName },
    label: label && { serial: who.serial!, state: label.state, problem: label.problem },
  };
  return { standing, pendingBin: awaiting && { ...awaiting, binCode: bench.binCode } };
}

/** Calibration, daily check, commissioning, training and equipment. Links and database are the station's own to say. */
export async function admitBench(
  db: Database,
  bench: BenchRow,
  accountId: string | null,
  lot: Pick<BenchLot, 'boardTypeId' | 'boardType' | 'sequence'> | null,
): Promise<Pick<Standing, 'readiness' | 'reasons'>> {
  const [facts, commissioning] = await Promise.all([
    readStationFacts(db, bench, { accountId, boardTypeId: lot?.boardTypeId ?? null }),
    findCommissioning(db, bench.id),
  ]);
  const { readiness, reasons } = admitStation({
    ...facts,
    nowIso: new Date().toISOString(),
    silent: [],
    stranger: null,
    databaseAnswers: true,
    hasController: linkHasController(bench.link),
    hasWiperProbe: bench.hasWiperProbe,
    sequence: lot?.sequence ?? null,
    sequenceErrors: lot && commissioning ? countErrors(lot, stationKindOf(bench, commissioning)) : 0,
  });
  return { readiness: readiness.filter(({ key }) => key !== 'links' && key !== 'database'), reasons };
}

/** The rules of the editor, at this station as it was commissioned. */
function countErrors({ sequence, boardType }: Pick<BenchLot, 'sequence' | 'boardType'>, station: StationKind): number {
  return checkSequence(sequence, boardType, station).filter(({ severity }) => severity === 'error').length;
}

/** As for production, but whoever may make engineering runs needs no training for the board type. */
export async function admitTrial(
  db: Database,
  bench: BenchRow,
  accountId: string | null,
  offer: OpenOffer,
): Promise<Pick<Standing, 'readiness' | 'reasons'>> {
  const account = accountId ? await findAccount(db, accountId) : null;
  const isEngineer = account !== null && mayDo(account.roles, 'make-engineering-runs');
  return admitBench(db, bench, isEngineer ? null : accountId, offer);
}

/** Another station that could take the lot now: nothing runs there and nothing forbids it. */
async function findFreeStation(
  db: Database,
  bench: BenchRow,
  accountId: string | null,
  lot: BenchLot | null,
): Promise<string | null> {
  const [benches, open] = await Promise.all([listBenches(db), listOpenRuns(db)]);
  for (const other of benches) {
    if (other.id === bench.id || open.some((run) => run.stationId === other.id)) continue;
    const { reasons } = await admitBench(db, other, accountId, lot);
    if (reasons.length === 0) return other.name;
  }
  return null;
}

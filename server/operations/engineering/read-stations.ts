import type { Database } from '@/db/client';
import { listOpenCalls, type OpenCall } from '@/db/queries/engineering-calls';
import { listOpenOffers, type OpenOffer } from '@/db/queries/engineering-offers';
import {
  listLotsOfStations,
  listNewestRunsOfStations,
  listSignedInOperators,
  type NewestRun,
  type SignedInOperator,
} from '@/db/queries/engineering-stations';
import { listBenches, type BenchRow } from '@/db/queries/station-benches';
import { findBenchLot } from '@/db/queries/station-lots';
import type { Say } from '@/lib/contracts/bench-view';
import {
  stationStates,
  type StationOffer,
  type StationRow,
  type StationsOverview,
} from '@/lib/contracts/station-overview';
import { database } from '@/server/postgres';
import { admitBench } from '../bench/read-standing';
import { readLotStrip } from '../runs/lot-strip';

interface Seen {
  run: NewestRun | undefined;
  call: OpenCall | undefined;
  operator: SignedInOperator | undefined;
  lotId: string | undefined;
  offer: OpenOffer | undefined;
}

/** Every station in use, most urgent first. */
export async function readStationsOverview(now = new Date()): Promise<StationsOverview> {
  const db = database();
  const benches = await listBenches(db);
  const see = await seeStations(db);
  const stations = await Promise.all(benches.map((bench) => readStationRow(db, bench, see(bench))));
  const urgency = (row: StationRow) => stationStates.indexOf(row.state);
  stations.sort((a, b) => urgency(a) - urgency(b) || a.code.localeCompare(b.code, 'en', { numeric: true }));
  return { atIso: now.toISOString(), stations };
}

/** Runs, calls, operators, lots and offers of all stations, looked up once. */
export async function seeStations(db: Database): Promise<(bench: BenchRow) => Seen> {
  const [runs, calls, operators, lots, offers] = await Promise.all([
    listNewestRunsOfStations(db),
    listOpenCalls(db),
    listSignedInOperators(db),
    listLotsOfStations(db),
    listOpenOffers(db),
  ]);
  return (bench) => ({
    run: runs.find((run) => run.stationId === bench.id),
    call: calls.find((call) => call.stationCode === bench.code),
    operator: operators.find((operator) => operator.stationId === bench.id),
    lotId: lots.get(bench.id),
    offer: offers.find((offer) => offer.stationId === bench.id),
  });
}

export async function readStationRow(
  db: Database,
  bench: BenchRow,
  { run, call, operator, lotId, offer }: Seen,
): Promise<StationRow> {
  const lot = lotId ? await findBenchLot(db, { lotId }) : null;
  const [{ reasons }, strip] = await Promise.all([
    admitBench(db, bench, null, null),
    lot ? readLotStrip(db, lot) : null,
  ]);
  const waitsForBin = run?.kind === 'production' && run.verdict === 'reject' && run.binScannedAt === null;
  const testing = run !== undefined && run.endedAt === null;
  const { state, since } = stateOf({ run, call, operator, reasons, waitsForBin, testing });
  return {
    id: bench.id,
    code: bench.code,
    name: bench.name,
    fixture: bench.fixture,
    simulated: bench.link.kind === 'simulated',
    state,
    sinceIso: since?.toISOString() ?? null,
    reasons: reasons.map(({ code, params }) => ({ code, params })),
    rejectReason: waitsForBin ? run.rejectReason : null,
    serial: (testing && run.kind !== 'daily-check') || waitsForBin ? run.serial : null,
    operatorNumber: testing ? run.operatorNumber : (operator?.operatorNumber ?? null),
    lot: strip,
    call: call ? { id: call.id, sinceIso: call.at.toISOString() } : null,
    engineering: testing && run.kind === 'engineering',
    offer: offer ? stationOfferOf(offer) : null,
  };
}

function stationOfferOf(offer: OpenOffer): StationOffer {
  const { id, revisionNumber, sequenceName, boardTypeCode, note, offeredByName, offeredAt } = offer;
  const sinceIso = offeredAt.toISOString();
  return { id, revisionNumber, sequenceName, boardTypeCode, note, offeredByName, sinceIso };
}

function stateOf({
  run,
  call,
  operator,
  reasons,
  waitsForBin,
  testing,
}: Pick<Seen, 'run' | 'call' | 'operator'> & { reasons: readonly Say[]; waitsForBin: boolean; testing: boolean }): {
  state: StationRow['state'];
  since: Date | null;
} {
  if (call) return { state: 'calls', since: call.at };
  if (testing) return { state: 'testing', since: run!.startedAt };
  if (reasons.length > 0) return { state: 'may-not-test', since: null };
  if (waitsForBin) return { state: 'waits-for-bin', since: run!.endedAt };
  return { state: 'idle', since: run?.endedAt ?? operator?.since ?? null };
}

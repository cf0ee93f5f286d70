import type { Database } from '@/db/client';
import { updateAccount } from '@/db/queries/accounts';
import { findActor } from '@/db/queries/sessions';
import { updateStationScheme, type BenchRow } from '@/db/queries/station-benches';
import { say } from '@/lib/bench/sayings';
import type { BenchAnswer, BenchAsk, BenchPlace } from '@/lib/bench/types';
import type { StationPorts } from '@/stations/run/ports';
import type { RunRecorder } from '../journal/run-recorder';
import { callEngineer } from '../operations/bench/call-engineer';
import { answerReference, commissionStation } from '../operations/bench/commission-station';
import { printAgain } from '../operations/bench/print-again';
import { readStanding } from '../operations/bench/read-standing';
import { answerBadge, answerPin, listOpenLots } from '../operations/bench/sign-in';
import { takeLot } from '../operations/bench/take-lot';
import { endOfferAtBench, takeOffer } from '../operations/bench/take-offer';
import { recordComponentBatch } from '../operations/lots/record-component-batch';
import { signOutSession } from '../operations/people/sign-out-session';
import { openRun } from '../operations/runs/open-run';
import { closeLostRun } from '../operations/runs/recover-open-runs';
import { scanBin } from '../operations/runs/scan-bin';

interface Log {
  warn(details: object, message: string): void;
}

/** What the server does for one station. */
export function stationPorts(db: Database, bench: BenchRow, recorder: RunRecorder, log: Log): StationPorts {
  return {
    async ask(ask, who) {
      if (ask.kind === 'board') {
        await recorder.storeEnded();
        await closeLostRun(db, bench.id, log);
      }
      return answer(db, bench, ask, who);
    },
    async standing(who) {
      // A reject that only the journal has must be known before the record is asked which bin is owed.
      await recorder.storeEnded();
      return readStanding(db, bench, who);
    },
    endSession: (sessionId) => signOutSession(sessionId, 'shift-ended'),
    saveScheme: (scheme) => updateStationScheme(db, bench.id, scheme),
    async saveLocale(accountId, locale) {
      await db.transaction((tx) => updateAccount(tx, accountId, { locale }));
    },
    saveCommissioning: (values, referenceCode, accountId) =>
      commissionStation(db, bench, values, { accountId, referenceCode }),
    logOf: (plan) => recorder.begin(plan),
  };
}

async function answer(db: Database, bench: BenchRow, ask: BenchAsk, who: BenchPlace): Promise<BenchAnswer> {
  switch (ask.kind) {
    case 'badge':
      return answerBadge(ask);
    case 'pin':
      return answerPin(db, bench, ask);
    case 'lot':
      return takeLot(db, bench, ask, who);
    case 'lots':
      return { ok: true, kind: 'lots', value: { lots: await listOpenLots(db) } };
    case 'board':
      return openRun(db, bench, ask, who);
    case 'offer':
      return takeOffer(db, bench, ask, who);
    case 'end-offer':
      return endOfferAtBench(bench, ask, who);
    case 'reference':
      return answerReference(db, ask.code);
    case 'bin':
      return scanBin(db, bench, ask, who);
    case 'call-engineer':
      return callEngineer(db, bench, who);
    case 'print-label':
      return printAgain(db, bench, ask.serial, who);
    case 'component-batch': {
      const actor = who.sessionId ? await findActor(db, who.sessionId) : null;
      if (!actor) return { ok: false, refusal: say('sign-in-first') };
      const { component, batch, lotId } = ask;
      const recorded = await recordComponentBatch(actor, { component, batch, lotId });
      if (!recorded.ok) return { ok: false, refusal: say('not-now') };
      return { ok: true, kind: 'component-batch', value: null };
    }
  }
}

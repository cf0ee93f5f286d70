import type { Database, Transaction } from '@/db/client';
import { insertTrail } from '@/db/queries/trail';
import { findRunRecord } from '@/db/queries/trail-chain';
import { canonicalJson } from '@/lib/canonical-json';
import { sha256 } from './sha256';

/** SHA-256 over a closed run as it is stored: the run, its measurements, events and traces. Null: no such run. */
export async function digestOfRun(db: Database | Transaction, runId: string): Promise<string | null> {
  const record = await findRunRecord(db, runId);
  return record && sha256(canonicalJson(record));
}

/** The hash of a run that was closed in this transaction enters its station's chain. */
export async function sealRun(
  tx: Transaction,
  run: { id: string; kind: string; stationId: string; operatorId: string; plan: { serial: string } },
  verdict: string,
): Promise<void> {
  await insertTrail(
    tx,
    { accountId: run.operatorId, stationId: run.stationId },
    {
      action: 'run.closed',
      entity: 'run',
      entityId: run.id,
      after: { serial: run.plan.serial, kind: run.kind, verdict, digest: await digestOfRun(tx, run.id) },
    },
  );
}

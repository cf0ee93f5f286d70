import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { calibrations } from '@/db/schema/calibrations';
import { dispositions } from '@/db/schema/dispositions';
import { instruments } from '@/db/schema/instruments';
import { measurements } from '@/db/schema/measurements';
import { runs } from '@/db/schema/runs';
import { signatures } from '@/db/schema/signatures';
import { stations } from '@/db/schema/stations';
import { trail } from '@/db/schema/trail';
import type { Measurement } from '@/lib/run/types';
import type { DecisionRule, Step } from '@/lib/sequence/step';

type Reader = Database | Transaction;

/** Runs that a certificate rests on, with what of their plan it states. */
export function listCertifiedRuns(db: Reader, runIds: readonly string[]) {
  return db
    .select({
      id: runs.id,
      attempt: runs.attempt,
      endedAt: runs.endedAt,
      stationId: runs.stationId,
      stationCode: stations.code,
      fixture: stations.fixture,
      operatorNumber: accounts.operatorNumber,
      sequenceRevision: sql<string>`${runs.plan} ->> 'sequenceRevision'`,
      decisionRule: sql<DecisionRule>`${runs.plan} #> '{sequence,decisionRule}'`,
    })
    .from(runs)
    .innerJoin(stations, eq(stations.id, runs.stationId))
    .innerJoin(accounts, eq(accounts.id, runs.operatorId))
    .where(inArray(runs.id, [...runIds]));
}

/** Steps of the sequence that a run was made by. */
export async function listStepsOfRun(db: Reader, runId: string): Promise<Step[]> {
  const [row] = await db
    .select({ steps: sql<Step[] | null>`${runs.plan} #> '{sequence,steps}'` })
    .from(runs)
    .where(eq(runs.id, runId));
  return row?.steps ?? [];
}

/** Measured values of runs in their order; `quantities` null: all. */
export function listCertifiedValues(
  db: Reader,
  runIds: readonly string[],
  quantities: readonly Measurement['quantity'][] | null,
): Promise<(typeof measurements.$inferSelect)[]> {
  return db
    .select()
    .from(measurements)
    .where(
      and(
        inArray(measurements.runId, [...runIds]),
        quantities ? inArray(measurements.quantity, [...quantities]) : undefined,
      ),
    )
    .orderBy(asc(measurements.n));
}

/** Reworks and complete concessions of units, oldest first, concessions with both signatures. */
export async function listCertifiedDecisions(db: Reader, unitIds: readonly string[]) {
  const rows = await db
    .select({
      runId: dispositions.runId,
      kind: dispositions.kind,
      action: dispositions.action,
      reason: dispositions.reason,
      signatureIds: sql<
        string[]
      >`array_remove(array[${dispositions.signatureId}, ${dispositions.secondSignatureId}], null)`,
      complete: sql<boolean>`${dispositions.kind} = 'rework' or ${dispositions.secondSignedAt} is not null`,
    })
    .from(dispositions)
    .where(and(inArray(dispositions.unitId, [...unitIds]), inArray(dispositions.kind, ['rework', 'concession'])))
    .orderBy(asc(dispositions.signedAt));
  const decided = rows.filter(({ complete }) => complete);
  const ids = decided.flatMap(({ kind, signatureIds }) => (kind === 'concession' ? signatureIds : []));
  const signed = ids.length === 0 ? [] : await db.select().from(signatures).where(inArray(signatures.id, ids));
  return decided.map(({ signatureIds, ...decision }) => ({
    ...decision,
    signatures: signed
      .filter(({ id }) => signatureIds.includes(id))
      .sort((a, b) => a.signedAt.getTime() - b.signedAt.getTime()),
  }));
}

/** Every instrument with all its calibrations, newest first, and every change of its place, oldest first. */
export async function listInstrumentHistories(db: Reader) {
  const [all, calibrated, moved] = await Promise.all([
    db.select().from(instruments).orderBy(asc(instruments.kind), asc(instruments.code)),
    db.select().from(calibrations).orderBy(desc(calibrations.calibratedOn), desc(calibrations.enteredAt)),
    listChanges(db, 'instrument'),
  ]);
  return all.map((instrument) => ({
    ...instrument,
    calibrations: calibrated.filter(({ instrumentId }) => instrumentId === instrument.id),
    changes: moved.filter(({ entityId }) => entityId === instrument.id),
  }));
}

/** Changes of all stations or instruments, oldest first. */
export async function listChanges(db: Reader, entity: 'station' | 'instrument') {
  const rows = await db
    .select({ entityId: trail.entityId, at: trail.at, before: trail.before, after: trail.after })
    .from(trail)
    .where(eq(trail.entity, entity))
    .orderBy(asc(trail.id));
  return rows.map(({ at, ...change }) => ({ ...change, atIso: at.toISOString() }));
}

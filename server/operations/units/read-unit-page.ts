import { labelledPoints, listLabelsOfUnit } from '@/db/queries/labels';
import { findUnitRecord } from '@/db/queries/unit-records';
import {
  findUnit,
  listDispositionsOfUnit,
  listMeasurements,
  listRetestOrdersOfUnit,
  listRunsOfUnit,
  listTraces,
} from '@/db/queries/units';
import type { UnitPage } from '@/lib/contracts/unit-page';
import { boardStanding } from '@/lib/decision/board-standing';
import { decidableKinds } from '@/lib/decision/disposition-problem';
import { database } from '@/server/postgres';
import { shownSignature } from '../signatures/shown-signature';
import { unitRunOf } from './unit-run';

/** Everything on record of one board, or null when there is none of that serial number. */
export async function readUnitPage(serial: string): Promise<UnitPage | null> {
  const db = database();
  const unit = await findUnit(db, serial);
  if (!unit) return null;
  const [record, made, labels, dispositions, retestOrders] = await Promise.all([
    findUnitRecord(db, unit.id),
    listRunsOfUnit(db, unit.id),
    listLabelsOfUnit(db, unit.id),
    listDispositionsOfUnit(db, unit.id),
    listRetestOrdersOfUnit(db, unit.id),
  ]);
  const runIds = made.map(({ run }) => run.id);
  const [measurements, traces] = await Promise.all([listMeasurements(db, runIds), listTraces(db, runIds)]);
  const passed = made.find(({ run }) => run.kind === 'production' && run.verdict === 'pass');
  return {
    id: unit.id,
    serial: unit.serial,
    position: unit.position,
    lotCode: unit.lotCode,
    lotHeld: unit.lotHeldAt !== null,
    boardTypeCode: unit.boardTypeCode,
    boardTypeName: unit.boardTypeName,
    standing: boardStanding(record!),
    decidable: decidableKinds(record!),
    runs: made.map((row) => unitRunOf(row, measurements, traces)),
    labels: labels.map(({ createdAt, printedAt, ...label }) => ({
      ...label,
      createdIso: createdAt.toISOString(),
      printedIso: printedAt?.toISOString() ?? null,
    })),
    dispositions: dispositions.map((row) => ({
      id: row.id,
      runId: row.runId,
      kind: row.kind,
      action: row.action,
      reason: row.reason,
      signedByName: row.signedByName,
      signedIso: row.signedAt.toISOString(),
      signatures: row.signatures.map(shownSignature),
    })),
    retestOrders: retestOrders.map(({ signedAt, ...order }) => ({ ...order, signedIso: signedAt.toISOString() })),
    label: passed ? await labelledPoints(db, passed.run.id) : null,
  };
}

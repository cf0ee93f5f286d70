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
import type { UnitPage, UnitRun } from '@/lib/contracts/unit-page';
import { boardStanding } from '@/lib/decision/board-standing';
import { database } from '@/server/postgres';

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
    runs: made.map((row) => ({
      ...runOf(row),
      measurements: measurements
        .filter((measurement) => measurement.runId === row.run.id)
        .map(({ runId: _runId, stepIndex: _stepIndex, ...measurement }) => measurement),
      traces: traces
        .filter((trace) => trace.runId === row.run.id)
        .map(({ kind, atMs, volts, output }) => ({ kind, atMs, volts, output })),
    })),
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
      secondSignedByName: row.secondSignedByName,
      secondSignedIso: row.secondSignedAt?.toISOString() ?? null,
    })),
    retestOrders: retestOrders.map(({ signedAt, ...order }) => ({ ...order, signedIso: signedAt.toISOString() })),
    label: passed ? await labelledPoints(db, passed.run.id) : null,
  };
}

type MadeRun = Awaited<ReturnType<typeof listRunsOfUnit>>[number];

function runOf({
  run,
  stationCode,
  fixture,
  operatorNumber,
  operatorName,
}: MadeRun): Omit<UnitRun, 'measurements' | 'traces'> {
  return {
    id: run.id,
    kind: run.kind,
    attempt: run.attempt,
    startedIso: run.startedAt.toISOString(),
    endedIso: run.endedAt?.toISOString() ?? null,
    seconds: run.seconds,
    verdict: run.verdict,
    rejectReason: run.rejectReason,
    likelyCause: run.likelyCause,
    noVerdictReason: run.noVerdictReason,
    faultCode: run.faultCode,
    faultDetail: run.faultDetail,
    failingWhenStopped: run.failingWhenStopped,
    supplyOff:
      run.supplyOffConfirmed === null
        ? null
        : { confirmed: run.supplyOffConfirmed, volts: run.supplyOffVolts, by: run.supplyOffBy },
    closedBy: run.closedBy,
    stationCode,
    fixture,
    operatorNumber,
    operatorName,
    sequenceRevision: run.plan.sequenceRevision,
    trimRounds: run.trimRounds,
    turnsAdvised: run.turnsAdvised,
    binCode: run.binCode,
    binScannedIso: run.binScannedAt?.toISOString() ?? null,
    limits: run.plan.boardType?.limits ?? null,
    adjustments: run.adjustments ?? [],
  };
}

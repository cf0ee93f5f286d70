import { findOfferHead } from '@/db/queries/engineering-offers';
import { findEngineeringRun, listMeasurements, listTraces } from '@/db/queries/units';
import type { EngineeringRunPage } from '@/lib/contracts/engineering-offer';
import { database } from '@/server/postgres';
import { unitRunOf } from '../../units/unit-run';

/** The record of one engineering run; null when there is none of that id. The board may belong to no lot. */
export async function readEngineeringRun(runId: string): Promise<EngineeringRunPage | null> {
  const db = database();
  const made = await findEngineeringRun(db, runId);
  if (!made) return null;
  const [offer, measurements, traces] = await Promise.all([
    findOfferHead(db, made.run.offerId!),
    listMeasurements(db, [runId]),
    listTraces(db, [runId]),
  ]);
  const { plan, unitId } = made.run;
  return {
    serial: plan.serial,
    boardTypeCode: plan.boardType.code,
    isUnit: unitId !== null,
    ...offer!,
    run: unitRunOf(made, measurements, traces),
  };
}

import { findReferenceBoardForUpdate } from '@/db/queries/engineering-references';
import { insertDailyCheck } from '@/db/queries/station-references';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { DailyCheckForm } from '@/lib/contracts/daily-check';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';
import { holdAfterFailedCheck } from '../holds/check-holds';

/**
 * A daily check measured beside the station and entered by hand; judged like one that the bench made. Code:
 * reference-unknown.
 */
export async function recordDailyCheck(
  actor: Actor,
  form: DailyCheckForm,
  at = new Date(),
): Promise<Outcome<{ passed: boolean }>> {
  return database().transaction(async (tx) => {
    const reference = await findReferenceBoardForUpdate(tx, form.referenceBoardId);
    if (!reference || reference.retiredAt)
      return refusal('reference-unknown', 'This reference board is not in use.', 'referenceBoardId');
    const within = (measured: number, known: number) => Math.abs(measured - known) <= reference.toleranceVolts + 1e-9;
    const passed = within(form.tripVolts, reference.tripVolts) && within(form.releaseVolts, reference.releaseVolts);
    await insertDailyCheck(tx, { ...form, passed, at, byAccountId: actor.accountId });
    if (!passed) await holdAfterFailedCheck(tx, form.stationId, at);
    await insertTrail(tx, actor, {
      action: 'station.daily-check',
      entity: 'station',
      entityId: form.stationId,
      after: { ...form, passed },
    });
    return success({ passed });
  });
}

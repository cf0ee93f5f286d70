import { insertEnrolment, revokeEnrolments } from '@/db/queries/station-enrolments';
import { findStationByCode } from '@/db/queries/station-settings';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import { hashToken, makeToken } from '@/server/auth/secret-hash';
import { database } from '@/server/postgres';

/**
 * Makes the browser that asks the bench of a station: `token` goes into its cookie and is kept nowhere else.
 * Codes: station-unknown.
 */
export async function enrolBrowser(actor: Actor, code: string): Promise<Outcome<{ token: string }>> {
  const token = makeToken();
  return database().transaction(async (tx) => {
    const station = await findStationByCode(tx, code);
    if (!station || station.retiredAt) return refusal('station-unknown', `There is no station ${code} in use.`);
    const enrolmentId = await insertEnrolment(tx, {
      stationId: station.id,
      tokenHash: hashToken(token),
      enrolledBy: actor.accountId,
    });
    await insertTrail(tx, actor, {
      action: 'station.browser-enrolled',
      entity: 'station',
      entityId: station.id,
      after: { code: station.code, enrolmentId },
    });
    return success({ token });
  });
}

/** Ends every enrolment of a station; its screens go dark within moments. Codes: station-unknown. */
export async function revokeBrowsers(actor: Actor, code: string): Promise<Outcome<{ revoked: number }>> {
  return database().transaction(async (tx) => {
    const station = await findStationByCode(tx, code);
    if (!station) return refusal('station-unknown', `There is no station ${code}.`);
    const revoked = await revokeEnrolments(tx, station.id);
    if (revoked > 0)
      await insertTrail(tx, actor, {
        action: 'station.browsers-revoked',
        entity: 'station',
        entityId: station.id,
        after: { code: station.code, revoked },
      });
    return success({ revoked });
  });
}

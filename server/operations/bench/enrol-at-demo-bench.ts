import { findAdministrator } from '@/db/queries/accounts';
import { findBenchByCode } from '@/db/queries/station-benches';
import { insertEnrolment } from '@/db/queries/station-enrolments';
import { insertTrail } from '@/db/queries/trail';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import { hashToken, makeToken } from '@/server/auth/secret-hash';
import { environment } from '@/server/environment';
import { database } from '@/server/postgres';

/**
 * Makes the browser that asks the screen of a simulated station, in the demo only; the demo's administrator answers for it.
 * Codes: not-a-demo, station-unknown.
 */
export async function enrolAtDemoBench(code: string): Promise<Outcome<{ token: string; code: string }>> {
  if (!environment().demo) return refusal('not-a-demo', 'An administrator makes a browser the screen of a station.');
  const db = database();
  const [bench, administrator] = await Promise.all([findBenchByCode(db, code), findAdministrator(db)]);
  if (bench?.link.kind !== 'simulated' || !administrator)
    return refusal('station-unknown', `There is no simulated station ${code}.`);
  const token = makeToken();
  await db.transaction(async (tx) => {
    const enrolmentId = await insertEnrolment(tx, {
      stationId: bench.id,
      tokenHash: hashToken(token),
      enrolledBy: administrator.id,
    });
    const after = { code: bench.code, enrolmentId, demo: true };
    await insertTrail(tx, null, { action: 'station.browser-enrolled', entity: 'station', entityId: bench.id, after });
  });
  return success({ token, code: bench.code });
}

import { isUniqueViolation } from '@/db/errors';
import { findStationByCode, insertStation, updateStation, type StationRow } from '@/db/queries/station-settings';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { printCode } from '@/lib/bench/scan-code';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import type { StationSettings } from '@/lib/contracts/station-settings';
import { database } from '@/server/postgres';

function trailFieldsOf({
  code,
  name,
  fixture,
  scheme,
  link,
  hasWiperProbe,
  printerId,
  mainsHz,
  retiredAt,
}: StationRow) {
  return { code, name, fixture, scheme, link, hasWiperProbe, printerId, mainsHz, retiredAt };
}

/** Makes a station; the barcode of its red bin follows from its code. Codes: station-exists. */
export async function addStation(actor: Actor, settings: StationSettings): Promise<Outcome> {
  try {
    return await database().transaction(async (tx) => {
      const station = await insertStation(tx, { ...settings, binCode: printCode('bin', settings.code) });
      await insertTrail(tx, actor, {
        action: 'station.added',
        entity: 'station',
        entityId: station.id,
        after: trailFieldsOf(station),
      });
      return done;
    });
  } catch (error) {
    if (isUniqueViolation(error))
      return refusal('station-exists', `There is a station ${settings.code} already.`, 'code');
    throw error;
  }
}

/** Changes a station by its code; its running bench opens its instruments anew between boards. Codes: station-unknown. */
export async function changeStation(actor: Actor, settings: StationSettings): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const before = await findStationByCode(tx, settings.code);
    if (!before) return refusal('station-unknown', `There is no station ${settings.code}.`);
    const after = await updateStation(tx, before.id, settings);
    await insertTrail(tx, actor, {
      action: 'station.changed',
      entity: 'station',
      entityId: before.id,
      before: trailFieldsOf(before),
      after: trailFieldsOf(after),
    });
    return done;
  });
}

/** Takes a station out of use, or back into it. Codes: station-unknown. */
export async function retireStation(
  actor: Actor,
  form: { code: string; reason: string },
  retired: boolean,
): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const before = await findStationByCode(tx, form.code);
    if (!before) return refusal('station-unknown', `There is no station ${form.code}.`);
    if ((before.retiredAt !== null) === retired) return done;
    await updateStation(tx, before.id, { retiredAt: retired ? new Date() : null });
    await insertTrail(tx, actor, {
      action: retired ? 'station.retired' : 'station.returned',
      entity: 'station',
      entityId: before.id,
      before: { code: before.code, retired: !retired },
      after: { code: before.code, retired },
      reason: form.reason,
    });
    return done;
  });
}

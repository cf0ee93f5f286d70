import { isUniqueViolation } from '@/db/errors';
import {
  findInstrumentForUpdate,
  insertCalibration,
  insertInstrument,
  listCertificates,
  listInstruments,
  listStationsInUse,
  updateInstrument,
} from '@/db/queries/engineering-instruments';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { CalibrationForm, ChangeInstrumentForm, InstrumentForm } from '@/lib/contracts/calibration';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

export async function readInstruments() {
  const db = database();
  const [instruments, certificates, stations] = await Promise.all([
    listInstruments(db),
    listCertificates(db, 200),
    listStationsInUse(db),
  ]);
  return { instruments, certificates, stations };
}

/** Codes: instrument-exists. */
export async function addInstrument(actor: Actor, form: InstrumentForm): Promise<Outcome> {
  try {
    return await database().transaction(async (tx) => {
      const values = {
        code: form.code,
        kind: form.kind,
        stationId: form.stationId || null,
        expectedIdentity: form.expectedIdentity || null,
      };
      const { id } = await insertInstrument(tx, values);
      await insertTrail(tx, actor, { action: 'instrument.added', entity: 'instrument', entityId: id, after: values });
      return done;
    });
  } catch (error) {
    if (isUniqueViolation(error)) return refusal('instrument-exists', `Instrument ${form.code} exists.`, 'code');
    throw error;
  }
}

/** Moves it to another station or the store, changes the answer it must give, or retires it. Code: instrument-unknown. */
export async function changeInstrument(actor: Actor, form: ChangeInstrumentForm, at = new Date()): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const before = await findInstrumentForUpdate(tx, form.instrumentId);
    if (!before) return refusal('instrument-unknown', 'This instrument does not exist.');
    const after = {
      stationId: form.retired ? null : form.stationId || null,
      expectedIdentity: form.expectedIdentity || null,
      retiredAt: form.retired ? (before.retiredAt ?? at) : null,
    };
    await updateInstrument(tx, before.id, after);
    await insertTrail(tx, actor, {
      action: 'instrument.changed',
      entity: 'instrument',
      entityId: before.id,
      before: { stationId: before.stationId, expectedIdentity: before.expectedIdentity, retiredAt: before.retiredAt },
      after,
    });
    return done;
  });
}

/** Records a certificate; the newest counts. Codes: instrument-unknown, calibration-in-future. */
export async function recordCalibration(actor: Actor, form: CalibrationForm, now = new Date()): Promise<Outcome> {
  if (form.calibratedOn > now.toISOString().slice(0, 10))
    return refusal('calibration-in-future', 'The calibration lies in the future. Check the day.', 'calibratedOn');
  return database().transaction(async (tx) => {
    const instrument = await findInstrumentForUpdate(tx, form.instrumentId);
    if (!instrument) return refusal('instrument-unknown', 'This instrument does not exist.');
    const { id } = await insertCalibration(tx, { ...form, enteredBy: actor.accountId });
    await insertTrail(tx, actor, {
      action: 'instrument.calibrated',
      entity: 'instrument',
      entityId: instrument.id,
      after: { calibrationId: id, ...form },
    });
    return done;
  });
}

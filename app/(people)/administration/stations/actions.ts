'use server';

import { revalidatePath } from 'next/cache';
import { cookies } from 'next/headers';
import { done, type Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { retireStationSchema, stationCodeSchema, stationSchema } from '@/lib/contracts/station-settings';
import { authorise } from '@/server/auth/authorise';
import { enrolmentCookie, enrolmentCookieOptions } from '@/server/auth/enrolment-cookie';
import { enrolBrowser, revokeBrowsers } from '@/server/operations/stations/enrol-browser';
import { addStation, changeStation, retireStation } from '@/server/operations/stations/save-station';

const page = '/administration/stations';

export async function addStationAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-stations');
  const form = parseForm(stationSchema, input);
  if (!form.ok) return form;
  const outcome = await addStation(actor, form.value);
  if (outcome.ok) revalidatePath(page);
  return outcome;
}

export async function changeStationAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-stations');
  const form = parseForm(stationSchema, input);
  if (!form.ok) return form;
  const outcome = await changeStation(actor, form.value);
  if (outcome.ok) revalidatePath(page, 'layout');
  return outcome;
}

export async function retireStationAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-stations');
  const form = parseForm(retireStationSchema, input);
  if (!form.ok) return form;
  const outcome = await retireStation(actor, form.value, true);
  if (outcome.ok) revalidatePath(page, 'layout');
  return outcome;
}

export async function returnStationAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-stations');
  const form = parseForm(retireStationSchema, input);
  if (!form.ok) return form;
  const outcome = await retireStation(actor, form.value, false);
  if (outcome.ok) revalidatePath(page, 'layout');
  return outcome;
}

/** Makes the browser that calls it the bench of a station. */
export async function enrolBrowserAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-stations');
  const form = parseForm(stationCodeSchema, input);
  if (!form.ok) return form;
  const outcome = await enrolBrowser(actor, form.value.code);
  if (!outcome.ok) return outcome;
  (await cookies()).set(enrolmentCookie, outcome.value.token, enrolmentCookieOptions());
  revalidatePath(page, 'layout');
  return done;
}

export async function revokeBrowsersAction(input: unknown): Promise<Outcome<{ revoked: number }>> {
  const actor = await authorise('manage-stations');
  const form = parseForm(stationCodeSchema, input);
  if (!form.ok) return form;
  const outcome = await revokeBrowsers(actor, form.value.code);
  if (outcome.ok) revalidatePath(page, 'layout');
  return outcome;
}

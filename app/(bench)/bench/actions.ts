'use server';

import { cookies } from 'next/headers';
import { redirect } from 'next/navigation';
import { enrolmentCookie, enrolmentCookieOptions } from '@/server/auth/enrolment-cookie';
import { enrolAtDemoBench } from '@/server/operations/bench/enrol-at-demo-bench';

/** In the demo only: this browser becomes the screen of a simulated station. Anyone may, since nothing real is energised. */
export async function standAtDemoBench(stationCode: string): Promise<void> {
  const enrolled = await enrolAtDemoBench(String(stationCode));
  if (!enrolled.ok) redirect('/bench');
  (await cookies()).set(enrolmentCookie, enrolled.value.token, enrolmentCookieOptions());
  redirect(`/bench/${enrolled.value.code}`);
}

import { redirect } from 'next/navigation';
import { startPageFor } from '@/lib/access/menu';
import { authorise, currentActor, currentEnrolment } from '@/server/auth/authorise';

/** Nothing of its own: a bench browser goes to its bench, a person to where their work begins. */
export default async function StartPage() {
  const [known, enrolment] = await Promise.all([currentActor(), currentEnrolment()]);
  if (!known && enrolment) redirect(`/bench/${enrolment.stationCode}`);
  const actor = await authorise('signed-in');
  redirect(startPageFor(actor.roles));
}

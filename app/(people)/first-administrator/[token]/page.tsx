import type { Metadata } from 'next';
import { Entrance } from '@/components/people/entrance';
import { FirstAdministratorForm } from '@/components/people/first-administrator-form';
import { firstAdministratorLinkWorks } from '@/server/operations/people/first-administrator';
import { makeFirstAdministratorAction } from './actions';

export const metadata: Metadata = { title: 'First administrator', referrer: 'no-referrer' };

export default async function FirstAdministratorPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  if (!(await firstAdministratorLinkWorks(token)))
    return (
      <Entrance title="This link no longer works">
        <p>It was used, or is older than a day. Start the server again for a new one.</p>
      </Entrance>
    );
  return (
    <Entrance
      title="Make the first administrator"
      foot="The administrator gives everyone else their accounts, badges and roles, and signs nothing."
    >
      <FirstAdministratorForm token={token} make={makeFirstAdministratorAction} />
    </Entrance>
  );
}

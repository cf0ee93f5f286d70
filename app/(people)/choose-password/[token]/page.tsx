import type { Metadata } from 'next';
import { ChoosePasswordForm } from '@/components/people/choose-password-form';
import { Entrance } from '@/components/people/entrance';
import { passwordLinkWorks } from '@/server/operations/people/choose-password';
import { choosePasswordAction } from './actions';

export const metadata: Metadata = { title: 'Choose a password', referrer: 'no-referrer' };

export default async function ChoosePasswordPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  if (!(await passwordLinkWorks(token)))
    return (
      <Entrance title="This link no longer works">
        <p>It was used, or is too old. Ask the administrator for a new one.</p>
      </Entrance>
    );
  return (
    <Entrance title="Choose a password" foot="Pages that are open with your account end when the password changes.">
      <ChoosePasswordForm token={token} choose={choosePasswordAction} />
    </Entrance>
  );
}

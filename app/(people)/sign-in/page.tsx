import type { Metadata } from 'next';
import { Entrance } from '@/components/people/entrance';
import { SignInForm } from '@/components/people/sign-in-form';
import { Notice } from '@/components/ui/notice';
import { localPath } from '@/lib/access/local-path';

export const metadata: Metadata = { title: 'Sign in' };

/** Why the page came up, by `because` in the address. */
const reasons: Record<string, string> = {
  ended: 'Your session has ended. Sign in again to go on.',
  locked: 'The page locked after 15 minutes without a key.',
  chosen: 'Your password is set. Sign in with it.',
  made: 'The account is made. Sign in with it.',
};

interface Props {
  searchParams: Promise<{ next?: string; because?: string }>;
}

export default async function SignInPage({ searchParams }: Props) {
  const { next, because } = await searchParams;
  const reason = because ? reasons[because] : undefined;
  return (
    <Entrance
      title="Sign in"
      foot={
        <>
          <p>
            Your name goes on every release, signature and limit you change. After 15 minutes without a key the page
            locks.
          </p>
          <p className="mt-2">Password forgotten? The administrator gives you a link to choose a new one.</p>
        </>
      }
    >
      {reason ? (
        <div className="mb-5">
          <Notice>{reason}</Notice>
        </div>
      ) : null}
      <SignInForm next={localPath(next)} />
    </Entrance>
  );
}

import type { Metadata } from 'next';
import { Entrance } from '@/components/people/entrance';
import { ButtonLink } from '@/components/ui/button';

export const metadata: Metadata = { title: 'Not allowed' };

export default function NotAllowedPage() {
  return (
    <Entrance title="Your roles do not allow this">
      <p className="mb-6">
        You are signed in, but nothing in your roles opens this page. The administrator gives roles; quality and
        engineers sign for each other.
      </p>
      <ButtonLink kind="filled" href="/">
        Go to your start page
      </ButtonLink>
    </Entrance>
  );
}

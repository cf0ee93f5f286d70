import type { Metadata } from 'next';
import { Entrance } from '@/components/people/entrance';
import { ButtonLink } from '@/components/ui/button';

export const metadata: Metadata = { title: 'Nothing here' };

export default function NotFound() {
  return (
    <Entrance title="There is nothing at this address">
      <p className="mb-6">The address may be mistyped, or what stood here was moved.</p>
      <ButtonLink kind="filled" href="/">
        Go to your start page
      </ButtonLink>
    </Entrance>
  );
}

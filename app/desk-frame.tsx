import { cookies } from 'next/headers';
import type { ReactNode } from 'react';
import { SessionWatch } from '@/components/people/session-watch';
import { SignOutButton } from '@/components/people/sign-out-button';
import { DeskShell } from '@/components/ui/desk-shell';
import { schemeCookie } from '@/components/ui/scheme';
import { menuFor } from '@/lib/access/menu';
import { currentActor } from '@/server/auth/authorise';

/**
 * The frame of every page at a desk: menu of what the person may open, their name, signing out. `extra` stands left of the
 * name. It guards nothing: each page asks for its own access.
 */
export async function DeskFrame({ children, extra }: { children: ReactNode; extra?: ReactNode }) {
  const actor = await currentActor();
  const chosen = (await cookies()).get(schemeCookie)?.value;
  const scheme = chosen === 'day' || chosen === 'night' ? chosen : 'system';
  return (
    <DeskShell
      links={actor ? menuFor(actor.roles) : []}
      scheme={scheme}
      aside={
        actor ? (
          <>
            {extra}
            <span>{actor.name}</span>
            <SignOutButton />
          </>
        ) : null
      }
    >
      {actor ? <SessionWatch /> : null}
      {children}
    </DeskShell>
  );
}

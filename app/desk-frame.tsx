import { cookies } from 'next/headers';
import type { ReactNode } from 'react';
import { CallBanner } from '@/components/desk/call-banner';
import { DeskQuery } from '@/components/desk/desk-query';
import { DeskSearch } from '@/components/desk/desk-search';
import { SessionWatch } from '@/components/people/session-watch';
import { SignOutButton } from '@/components/people/sign-out-button';
import { DeskShell } from '@/components/ui/desk-shell';
import { schemeCookie } from '@/components/ui/scheme';
import { actorMay } from '@/lib/access/actor';
import { menuFor } from '@/lib/access/menu';
import { currentActor } from '@/server/auth/authorise';
import { acknowledgeCallAction } from './(engineering)/calls/actions';

/**
 * The frame of every page at a desk: menu of what the person may open, search, calls for an engineer, their name, signing out.
 * `extra` stands left of the name. It guards nothing: each page asks for its own access.
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
            <DeskSearch />
            {extra}
            <span>{actor.name}</span>
            <SignOutButton />
          </>
        ) : null
      }
    >
      {actor ? <SessionWatch /> : null}
      <DeskQuery>
        {actor ? (
          <CallBanner acknowledge={actorMay(actor, 'acknowledge-calls') ? acknowledgeCallAction : null} />
        ) : null}
        {children}
      </DeskQuery>
    </DeskShell>
  );
}

import { Time } from '@/components/desk/time';
import { ButtonLink } from '@/components/ui/button';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { Outcome } from '@/lib/contracts/outcome';
import { AccountStateButton } from './account-state-button';
import { PasswordLinkButton } from './password-link-button';
import { SetPinButton } from './set-pin-button';

export interface PanelPerson {
  accountId: string;
  name: string;
  email: string | null;
  operatorNumber: string | null;
  badgeCode: string | null;
  hasPassword: boolean;
  hasPin: boolean;
  createdIso: string;
  disabledIso: string | null;
  waiting: { failures: number; stationCode: string | null; lastTryIso: string; untilIso: string } | null;
}

export interface PersonActions {
  setPin: (input: unknown) => Promise<Outcome>;
  makePasswordLink: (input: unknown) => Promise<Outcome<{ link: string; hours: number }>>;
  disable: (input: unknown) => Promise<Outcome>;
  enable: (input: unknown) => Promise<Outcome>;
}

/** The chosen person: what stops them from signing in, and what the administrator can do about it. */
export function PersonPanel({ person, own, actions }: { person: PanelPerson; own: boolean; actions: PersonActions }) {
  const { accountId, waiting, disabledIso } = person;
  const facts = [
    person.badgeCode ? `badge ${person.badgeCode}` : null,
    person.operatorNumber ? `number ${person.operatorNumber} at benches` : null,
    person.email,
  ].filter(Boolean);
  return (
    <section aria-label={person.name} className="grid gap-4">
      <div>
        <h2 className="text-lead font-bold">{person.name}</h2>
        <p className="text-ink-2">
          {facts.join(', ')}
          {facts.length > 0 ? ', ' : ''}since <Time iso={person.createdIso} format="day" />.
        </p>
      </div>
      {disabledIso ? (
        <p>
          <b>
            Closed <Time iso={disabledIso} />.
          </b>{' '}
          Records made before stay valid.
        </p>
      ) : null}
      {waiting && !disabledIso ? (
        <p>
          <VerdictMark shape="reject" size={14} />{' '}
          <b>
            Locked at <Time iso={waiting.lastTryIso} format="short-clock" />
          </b>{' '}
          after {waiting.failures} wrong {waiting.stationCode ? `PINs at ${waiting.stationCode}` : 'passwords'}. The
          next try is open at <Time iso={waiting.untilIso} format="clock" />.
        </p>
      ) : null}
      {!disabledIso && !person.hasPin && person.badgeCode ? (
        <Missing>No PIN yet: the badge opens nothing.</Missing>
      ) : null}
      {!disabledIso && !person.hasPassword && person.email ? (
        <Missing>No password yet: give a link to choose one.</Missing>
      ) : null}
      <div className="flex flex-wrap items-start gap-3">
        {disabledIso ? null : (
          <>
            {person.badgeCode ? (
              <SetPinButton
                accountId={accountId}
                name={person.name}
                locked={waiting !== null && waiting.stationCode !== null}
                setPin={actions.setPin}
              />
            ) : null}
            {person.email ? (
              <PasswordLinkButton accountId={accountId} name={person.name} make={actions.makePasswordLink} />
            ) : null}
            {person.badgeCode ? (
              <ButtonLink href={`/administration/people/${accountId}/badge`}>Print the badge</ButtonLink>
            ) : null}
            <ButtonLink href={`/administration/people/${accountId}`}>Change…</ButtonLink>
          </>
        )}
        <AccountStateButton
          accountId={accountId}
          name={person.name}
          closed={disabledIso !== null}
          own={own}
          act={disabledIso ? actions.enable : actions.disable}
        />
      </div>
    </section>
  );
}

function Missing({ children }: { children: string }) {
  return (
    <p className="flex items-center gap-1.5">
      <VerdictMark shape="check" size={14} /> {children}
    </p>
  );
}

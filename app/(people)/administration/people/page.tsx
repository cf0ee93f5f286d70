import type { Metadata } from 'next';
import { AdministrationTabs } from '@/components/people/administration-tabs';
import { PeopleTable, type PersonTableRow } from '@/components/people/people-table';
import { PeopleToolbar } from '@/components/people/people-toolbar';
import { PersonPanel } from '@/components/people/person-panel';
import { RolesTable } from '@/components/people/roles-table';
import { ButtonLink } from '@/components/ui/button';
import { PageHead } from '@/components/ui/page-head';
import { scanPrefixes } from '@/lib/bench/scan-code';
import { peopleFilterSchema, type PeopleFilter } from '@/lib/contracts/people-filter';
import { authorise } from '@/server/auth/authorise';
import { listPersons, type Person } from '@/server/operations/people/list-people';
import { disablePersonAction, enablePersonAction, makePasswordLinkAction, setPinAction } from './actions';

export const metadata: Metadata = { title: 'People and roles' };

interface Props {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

const soonMs = 30 * 86_400_000;

const stateOf = (person: Person): PersonTableRow['state'] =>
  person.disabledIso ? 'closed' : person.waiting ? 'waiting' : 'active';

const badgeNumberOf = (person: Person) => person.badgeCode?.slice(scanPrefixes.badge.length) ?? null;

function shows(filter: PeopleFilter, person: Person): boolean {
  const state = stateOf(person);
  const inState = {
    active: state !== 'closed',
    locked: state === 'waiting',
    closed: state === 'closed',
    all: true,
  }[filter.state];
  const searched = [person.name, person.email, person.operatorNumber, person.badgeCode].join(' ').toLowerCase();
  return (
    inState &&
    (filter.role === null || person.roles.includes(filter.role)) &&
    searched.includes(filter.named.toLowerCase())
  );
}

function rowOf(person: Person, nowMs: number): PersonTableRow {
  const until = person.trainedUntilIso ? Date.parse(person.trainedUntilIso) : null;
  return {
    accountId: person.accountId,
    name: person.name,
    signsInAs: person.email ?? `badge ${badgeNumberOf(person) ?? 'missing'}`,
    roles: person.roles,
    trainedUntilIso: person.trainedUntilIso,
    training: until === null ? 'none' : until < nowMs ? 'ended' : until < nowMs + soonMs ? 'soon' : 'valid',
    lastSeenIso: person.lastSeenIso,
    state: stateOf(person),
  };
}

export default async function PeoplePage({ searchParams }: Props) {
  const actor = await authorise('manage-accounts');
  const filter = peopleFilterSchema.parse(await searchParams);
  const now = new Date();
  const people = await listPersons(now);
  const shown = people.filter((person) => shows(filter, person));
  const chosen = people.find((person) => person.accountId === filter.who) ?? null;
  return (
    <>
      <PageHead
        title="People and roles"
        tabs={<AdministrationTabs />}
        actions={
          <ButtonLink kind="filled" href="/administration/people/new">
            Add a person
          </ButtonLink>
        }
      />
      <PeopleToolbar filter={filter} shown={shown.length} all={people.length} />
      <div className="mt-2 grid items-start gap-x-9 gap-y-8 xl:grid-cols-[minmax(0,1fr)_330px]">
        <PeopleTable rows={shown.map((person) => rowOf(person, now.getTime()))} chosen={filter.who} />
        <aside className={`grid gap-2 pt-3 ${chosen ? 'max-xl:order-first' : ''}`}>
          {chosen ? (
            <PersonPanel
              key={chosen.accountId}
              person={chosen}
              own={chosen.accountId === actor.accountId}
              actions={{
                setPin: setPinAction,
                makePasswordLink: makePasswordLinkAction,
                disable: disablePersonAction,
                enable: enablePersonAction,
              }}
            />
          ) : (
            <p className="text-ink-2">Choose a name to set a PIN, print a badge, or close an account.</p>
          )}
          <RolesTable />
        </aside>
      </div>
    </>
  );
}

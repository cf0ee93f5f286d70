import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { ChangePersonForm } from '@/components/people/person-form';
import { PageHead } from '@/components/ui/page-head';
import { scanPrefixes } from '@/lib/bench/scan-code';
import { benchLocales } from '@/lib/messages/bench-locales';
import { authorise } from '@/server/auth/authorise';
import { listPersons } from '@/server/operations/people/list-people';
import { changePersonAction } from '../actions';

export const metadata: Metadata = { title: 'Change a person' };

export default async function ChangePersonPage({ params }: { params: Promise<{ id: string }> }) {
  await authorise('manage-accounts');
  const { id } = await params;
  const person = (await listPersons()).find((p) => p.accountId === id);
  if (!person) notFound();
  const locales = benchLocales.map(({ locale, name }) => ({ value: locale, label: name }));
  return (
    <>
      <PageHead title={person.name} lede="Name, sign-in and roles" />
      <ChangePersonForm
        locales={locales}
        change={changePersonAction}
        start={{
          accountId: person.accountId,
          name: person.name,
          email: person.email ?? '',
          operatorNumber: person.operatorNumber ?? '',
          badgeNumber: person.badgeCode?.slice(scanPrefixes.badge.length) ?? '',
          roles: [...person.roles],
          locale: person.locale,
          reason: '',
        }}
      />
    </>
  );
}

import type { Metadata } from 'next';
import { AddPersonForm } from '@/components/people/person-form';
import { PageHead } from '@/components/ui/page-head';
import { benchLocales } from '@/lib/messages/bench-locales';
import { authorise } from '@/server/auth/authorise';
import { addPersonAction } from '../actions';

export const metadata: Metadata = { title: 'Add a person' };

export default async function AddPersonPage() {
  await authorise('manage-accounts');
  const locales = benchLocales.map(({ locale, name }) => ({ value: locale, label: name }));
  return (
    <>
      <PageHead title="Add a person" />
      <AddPersonForm locales={locales} add={addPersonAction} />
    </>
  );
}

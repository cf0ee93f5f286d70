import { redirect } from 'next/navigation';
import { authorise } from '@/server/auth/authorise';

export default async function AdministrationPage() {
  await authorise('manage-accounts');
  redirect('/administration/people');
}

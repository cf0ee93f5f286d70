import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { EngineeringRun } from '@/components/desk/offers/engineering-run';
import { authorise } from '@/server/auth/authorise';
import { readEngineeringRun } from '@/server/operations/engineering/offers/read-engineering-run';

export const metadata: Metadata = { title: 'Engineering run' };

const isId = (text: string) => /^[0-9a-f-]{36}$/.test(text);

export default async function EngineeringRunPage({ params }: { params: Promise<{ run: string }> }) {
  await authorise('signed-in');
  const { run } = await params;
  const page = isId(run) ? await readEngineeringRun(run) : null;
  if (!page) notFound();
  return <EngineeringRun page={page} />;
}

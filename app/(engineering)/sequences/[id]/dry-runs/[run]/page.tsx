import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { z } from 'zod';
import { DryRunLive } from '@/components/desk/dry-run/dry-run-live';
import { actorMay } from '@/lib/access/actor';
import { authorise } from '@/server/auth/authorise';
import { readDryRunPage } from '@/server/operations/engineering/dry-runs/read-dry-run';
import { askDryRunAction, cancelDryRunAction, keepDryRunAction } from '../../../dry-runs/actions';

interface Props {
  params: Promise<{ id: string; run: string }>;
}

export const metadata: Metadata = { title: 'Dry run' };

export default async function DryRunPage({ params }: Props) {
  const actor = await authorise('signed-in');
  const { id, run } = await params;
  const page = z.uuid().safeParse(run).success ? await readDryRunPage(run) : null;
  if (!page || page.sequenceId !== id) notFound();
  const actions = { ask: askDryRunAction, cancel: cancelDryRunAction, keep: keepDryRunAction };
  return <DryRunLive page={page} actions={actorMay(actor, 'edit-sequences') ? actions : null} />;
}

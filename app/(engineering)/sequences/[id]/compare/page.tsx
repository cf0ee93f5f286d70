import type { Metadata } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { PredictedSupply } from '@/components/charts/predicted-supply';
import { ComparisonFoot } from '@/components/desk/sequences/comparison-foot';
import { ComparisonTable } from '@/components/desk/sequences/comparison-table';
import { ComparisonToolbar } from '@/components/desk/sequences/comparison-toolbar';
import { ReleaseButtons } from '@/components/desk/sequences/release-buttons';
import { PageHead } from '@/components/ui/page-head';
import { comparisonViewSchema, type ComparisonPage } from '@/lib/contracts/sequence-pages';
import { predictSequence } from '@/lib/prediction/predict-sequence';
import { usualStation } from '@/lib/prediction/types';
import { compareSequences } from '@/lib/sequence/compare-sequences';
import { stepWord } from '@/lib/sequence/value-words';
import { authorise } from '@/server/auth/authorise';
import { readComparison } from '@/server/operations/engineering/sequences/read-comparison';
import { releaseRevisionAction, sendBackAction } from '../../actions';

export const metadata: Metadata = { title: 'Compare revisions' };

interface Props {
  params: Promise<{ id: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function ComparePage({ params, searchParams }: Props) {
  const actor = await authorise('signed-in');
  const { id } = await params;
  const view = comparisonViewSchema.parse(await searchParams);
  const page = isId(id) ? await readComparison(actor, id, view) : null;
  if (!page) notFound();
  const { a, b, boardType } = page;
  const comparison = compareSequences(a.sequence, b.sequence);
  const rows = view.steps === 'all' ? comparison.steps : comparison.steps.filter(({ changed }) => changed);
  const predicted = (of: ComparisonPage['a']) => predictSequence(of.sequence, boardType, usualStation);
  return (
    <>
      <PageHead
        title="Compare revisions"
        lede={<Lede page={page} />}
        actions={
          <ReleaseButtons page={page} signer={actor.name} release={releaseRevisionAction} sendBack={sendBackAction} />
        }
      />
      <ComparisonToolbar page={page} view={view} comparison={comparison} />
      <ComparisonTable page={page} comparison={comparison} rows={rows} />
      <div className="mt-6">
        <PredictedSupply
          title="Supply over one board"
          prediction={predicted(b)}
          comparison={{ name: `r${a.head.number}`, prediction: predicted(a) }}
          note={`dashed r${a.head.number}, solid r${b.head.number}`}
          limits={boardType.limits}
          steps={b.sequence.steps.map((step, i) => ({ id: step.id, number: i + 1, name: stepWord(step) }))}
          selectedId={null}
        />
      </div>
      <ComparisonFoot page={page} />
    </>
  );
}

function Lede({ page }: { page: ComparisonPage }) {
  const { sequenceId, sequenceName, b, mayRelease } = page;
  const { number, status, submittedBy } = b.head;
  return (
    <>
      <Link className="sw-link" href={`/sequences/${sequenceId}`}>
        {sequenceName}
      </Link>
      .{' '}
      {status === 'submitted' ? (
        <>
          {mayRelease ? `${submittedBy} asks you to release` : `${submittedBy} asks for the release of`}{' '}
          <b>r{number}</b>.
        </>
      ) : null}
    </>
  );
}

const isId = (text: string | undefined) => text !== undefined && /^[0-9a-f-]{36}$/.test(text);

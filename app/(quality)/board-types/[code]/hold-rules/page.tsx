import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { HoldRulesForm } from '@/components/desk/holds/hold-rules-form';
import { Time } from '@/components/desk/time';
import { ButtonLink } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHead, Section } from '@/components/ui/page-head';
import { actorMay } from '@/lib/access/actor';
import { authorise } from '@/server/auth/authorise';
import { readHoldRules } from '@/server/operations/holds/read-hold-rules';
import { setHoldRulesAction } from './actions';

interface Props {
  params: Promise<{ code: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `What holds lots of ${decodeURIComponent((await params).code)}` };
}

export default async function HoldRulesPage({ params }: Props) {
  const actor = await authorise('signed-in');
  const page = await readHoldRules(decodeURIComponent((await params).code));
  if (!page) notFound();
  return (
    <>
      <PageHead
        title={`What holds lots of ${page.code}`}
        lede="A lot is held by itself as soon as one of these is seen; its stations stop before the next board, and quality releases it."
        actions={<ButtonLink href={`/board-types/${encodeURIComponent(page.code)}`}>Board type</ButtonLink>}
      />
      <HoldRulesForm page={page} mayEdit={actorMay(actor, 'approve-limits')} set={setHoldRulesAction} />
      <Section title="Changes">
        {page.history.length === 0 ? (
          <EmptyState title="Nobody has changed them.">The usual rules count.</EmptyState>
        ) : (
          <ol>
            {page.history.map(({ setBy, setIso, reason }) => (
              <li key={setIso} className="border-b border-hair py-1.5">
                <span className="text-ink-2">
                  <Time iso={setIso} />, {setBy}:
                </span>{' '}
                {reason}
              </li>
            ))}
          </ol>
        )}
      </Section>
    </>
  );
}

import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { HistoryList } from '@/components/desk/sequences/history-list';
import { ImportButton } from '@/components/desk/sequences/import-button';
import { PageHead } from '@/components/ui/page-head';
import { actorMay } from '@/lib/access/actor';
import { authorise } from '@/server/auth/authorise';
import { readHistory } from '@/server/operations/engineering/sequences/read-history';
import { beginDraftAction, discardDraftAction, importSequenceAction, withdrawRevisionAction } from '../actions';

export const metadata: Metadata = { title: 'Revisions of a sequence' };

export default async function SequencePage({ params }: { params: Promise<{ id: string }> }) {
  const actor = await authorise('signed-in');
  const { id } = await params;
  const history = isId(id) ? await readHistory(actor, id) : null;
  if (!history) notFound();
  const mayEdit = actorMay(actor, 'edit-sequences');
  const standing = history.entries.find(({ head }) => head.status === 'draft' || head.status === 'submitted');
  return (
    <>
      <PageHead
        title={history.sequenceName}
        lede={
          <>
            For board type <span className="font-num">{history.boardTypeCode}</span>. Every revision, newest first.
          </>
        }
        actions={
          mayEdit ? (
            <ImportButton
              sequenceId={id}
              send={importSequenceAction}
              unavailable={standing ? `r${standing.head.number} is in work` : null}
            />
          ) : null
        }
      />
      <HistoryList
        history={history}
        may={{ edit: mayEdit, release: actorMay(actor, 'release-sequences') }}
        signer={actor.name}
        actions={{ begin: beginDraftAction, discard: discardDraftAction, withdraw: withdrawRevisionAction }}
      />
    </>
  );
}

const isId = (text: string | undefined) => text !== undefined && /^[0-9a-f-]{36}$/.test(text);

'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button, ButtonLink } from '@/components/ui/button';
import { buttonClass } from '@/components/ui/button-style';
import { useToast } from '@/components/ui/toast';
import type { Outcome } from '@/lib/contracts/outcome';
import type { HistoryEntry as Entry, SequenceHistory } from '@/lib/contracts/sequence-pages';
import { ReasonDialog } from '../reason-dialog';
import { HistoryEntry } from './history-entry';
import { WithdrawDialog } from './withdraw-dialog';

export interface HistoryActionsOf {
  begin: (input: unknown) => Promise<Outcome<{ revisionId: string; number: number }>>;
  discard: (input: unknown) => Promise<Outcome>;
  withdraw: (input: unknown) => Promise<Outcome>;
}

interface HistoryListProps {
  history: SequenceHistory;
  may: { edit: boolean; release: boolean };
  signer: string;
  actions: HistoryActionsOf;
}

/** Every revision, newest first, with what can be done to it. */
export function HistoryList({ history, may, signer, actions }: HistoryListProps) {
  const router = useRouter();
  const toast = useToast();
  const [asking, setAsking] = useState<{ entry: Entry; what: 'discard' | 'withdraw' } | null>(null);
  const [restoring, setRestoring] = useState<string | null>(null);
  const { sequenceId, entries } = history;
  const standing = entries.find(({ head }) => head.status === 'draft' || head.status === 'submitted');

  async function restore({ head }: Entry): Promise<void> {
    setRestoring(head.id);
    const outcome = await actions.begin({ sequenceId, fromRevisionId: head.id }).catch(() => null);
    setRestoring(null);
    if (!outcome?.ok) return toast(outcome?.sentence ?? 'The server did not answer. Nothing was stored. Try again.');
    toast(`r${outcome.value.number} begins with the steps of r${head.number}`);
    router.push(`/sequences/${sequenceId}/draft`);
  }
  const done = (said: string) => {
    setAsking(null);
    toast(said);
    router.refresh();
  };

  const actionsOf = (entry: Entry) => {
    const { head, comparedWith, mayRelease } = entry;
    const { number, status } = head;
    return (
      <>
        {status === 'draft' ? (
          <ButtonLink href={`/sequences/${sequenceId}/draft`}>
            {may.edit ? 'Open the draft' : 'See the draft'}
          </ButtonLink>
        ) : null}
        {status === 'submitted' ? (
          <ButtonLink kind={mayRelease ? 'filled' : 'outlined'} href={`/sequences/${sequenceId}/compare?b=r${number}`}>
            {mayRelease ? `Check and release r${number}` : `Compare r${number}`}
          </ButtonLink>
        ) : null}
        {comparedWith !== null ? (
          <ButtonLink kind="link" href={`/sequences/${sequenceId}/compare?a=r${comparedWith}&b=r${number}`}>
            Compare with r{comparedWith}
          </ButtonLink>
        ) : null}
        <a
          className={buttonClass('link')}
          href={`/api/sequences/${sequenceId}/export?revision=r${number}`}
          aria-label={`Export r${number}`}
          download
        >
          Export
        </a>
        {may.edit && entry !== standing ? (
          <Button
            kind="link"
            onClick={() => void restore(entry)}
            pending={restoring === head.id ? 'Beginning the draft' : null}
            unavailable={standing ? `r${standing.head.number} is in work` : null}
          >
            {status === 'released' ? 'Begin a draft from it' : 'Restore as a new draft'}
          </Button>
        ) : null}
        {may.edit && status === 'draft' ? (
          <Button kind="link" onClick={() => setAsking({ entry, what: 'discard' })}>
            Discard…
          </Button>
        ) : null}
        {may.release && (status === 'released' || status === 'superseded') ? (
          <Button kind="link" onClick={() => setAsking({ entry, what: 'withdraw' })}>
            Withdraw…
          </Button>
        ) : null}
      </>
    );
  };

  return (
    <>
      <ol>
        {entries.map((entry) => (
          <HistoryEntry key={entry.head.id} sequenceId={sequenceId} entry={entry} actions={actionsOf(entry)} />
        ))}
      </ol>
      {asking?.what === 'discard' ? (
        <ReasonDialog
          open
          onClose={() => setAsking(null)}
          title={`Discard r${asking.entry.head.number}?`}
          consequence="It is never released. Its steps stay in this history and can be restored as a new draft."
          verb={`Discard r${asking.entry.head.number}`}
          keep="Keep the draft"
          send={(reason) => actions.discard({ revisionId: asking.entry.head.id, reason })}
          onDone={() => done(`r${asking.entry.head.number} is discarded`)}
        />
      ) : null}
      {asking?.what === 'withdraw' ? (
        <WithdrawDialog
          head={asking.entry.head}
          openLots={asking.entry.lots.filter(({ state }) => state !== 'closed').map(({ code }) => code)}
          signer={signer}
          onClose={() => setAsking(null)}
          onDone={() => done(`r${asking.entry.head.number} is withdrawn`)}
          withdraw={actions.withdraw}
        />
      ) : null}
    </>
  );
}

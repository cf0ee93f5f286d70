'use client';

import { VerdictMark } from '@/components/ui/verdict-mark';
import type { DraftPage } from '@/lib/contracts/sequence-draft';
import { Time } from '../time';
import type { SaveState } from './use-autosave';

interface SavedWordsProps {
  page: DraftPage;
  saveState: SaveState;
  unsaved: boolean;
  savedAtIso: string;
  /** Texts that cannot be read yet. */
  unread: number;
}

/** Whether everything typed is safe, in a few words. */
export function SavedWords({ page: { head, mayEdit }, saveState, unsaved, savedAtIso, unread }: SavedWordsProps) {
  if (!mayEdit) {
    const [word, iso] = stands(head);
    return (
      <>
        {word} <Time iso={iso} />.
      </>
    );
  }
  if (saveState.kind === 'failed' || saveState.kind === 'refused')
    return (
      <span role="alert" className="font-bold text-reject">
        <VerdictMark shape="reject" size={14} /> not saved:{' '}
        {saveState.kind === 'failed'
          ? 'the server does not answer. Your text is kept here and sent again.'
          : saveState.sentence}
      </span>
    );
  return (
    <span>
      {unsaved || saveState.kind === 'saving' ? (
        'saving.'
      ) : (
        <>
          saved <Time iso={savedAtIso} format="short-clock" />.
        </>
      )}
      {unread > 0 ? ` ${unread === 1 ? 'One text' : `${unread} texts`} cannot be read yet and waits here.` : null}
    </span>
  );
}

function stands(head: DraftPage['head']): [word: string, iso: string] {
  if (head.withdrawnAtIso) return ['withdrawn', head.withdrawnAtIso];
  if (head.supersededAtIso) return ['superseded', head.supersededAtIso];
  if (head.releasedAtIso) return ['released', head.releasedAtIso];
  if (head.submittedAtIso && head.status === 'submitted') return ['submitted', head.submittedAtIso];
  return ['saved', head.savedAtIso];
}

import { VerdictMark } from '@/components/ui/verdict-mark';
import type { RevisionHead } from '@/lib/contracts/sequence-draft';

type State = Pick<RevisionHead, 'status' | 'releasedAtIso' | 'sentBackAtIso'>;

/** What a revision is now, as people say it. A withdrawn one that was never released is a discarded draft. */
export function revisionStateWords({ status, releasedAtIso, sentBackAtIso }: State): string {
  switch (status) {
    case 'draft':
      return sentBackAtIso ? 'draft, sent back' : 'draft';
    case 'submitted':
      return 'waits for release';
    case 'released':
      return 'in use';
    case 'superseded':
      return 'superseded';
    case 'withdrawn':
      return releasedAtIso ? 'withdrawn' : 'discarded draft';
  }
}

export function RevisionState({ head }: { head: State }) {
  const shape =
    head.status === 'released'
      ? 'pass'
      : head.status === 'submitted'
        ? 'check'
        : head.status === 'withdrawn' && head.releasedAtIso
          ? 'reject'
          : null;
  return (
    <span className="inline-flex items-center gap-1.5">
      {shape ? <VerdictMark shape={shape} size={15} /> : null}
      {revisionStateWords(head)}
    </span>
  );
}

import type { ReactNode } from 'react';
import type { RevisionHead } from '@/lib/contracts/sequence-draft';
import { Time } from '../time';

/** Who did what to a revision and when, newest last. */
export function HistoryPeople({ head }: { head: RevisionHead }) {
  const { basedOnNumber } = head;
  return (
    <ul className="grid gap-1">
      <Line who={head.madeBy} iso={head.madeAtIso}>
        {basedOnNumber === null ? 'began it' : `began it from r${basedOnNumber}`}
      </Line>
      {head.status === 'draft' && head.savedBy ? (
        <Line who={head.savedBy} iso={head.savedAtIso}>
          saved it last
        </Line>
      ) : null}
      {head.sentBackBy && head.sentBackAtIso ? (
        <Line who={head.sentBackBy} iso={head.sentBackAtIso} quote={head.sentBackReason}>
          sent it back
        </Line>
      ) : null}
      {head.submittedBy && head.submittedAtIso && !head.sentBackAtIso ? (
        <Line who={head.submittedBy} iso={head.submittedAtIso}>
          submitted it
        </Line>
      ) : null}
      {head.releasedBy && head.releasedAtIso ? (
        <Line who={head.releasedBy} iso={head.releasedAtIso} quote={head.releaseMeaning}>
          released it
        </Line>
      ) : null}
      {head.supersededAtIso ? (
        <li>
          Superseded, <Time iso={head.supersededAtIso} />
        </li>
      ) : null}
      {head.withdrawnBy && head.withdrawnAtIso ? (
        <Line who={head.withdrawnBy} iso={head.withdrawnAtIso} quote={head.withdrawnReason}>
          {head.releasedAtIso ? 'withdrew' : 'discarded'} it
        </Line>
      ) : null}
    </ul>
  );
}

interface LineProps {
  who: string;
  iso: string;
  /** What they gave as reason or meaning. */
  quote?: string | null;
  children: ReactNode;
}

function Line({ who, iso, quote, children }: LineProps) {
  return (
    <li>
      <b>{who}</b> {children}, <Time iso={iso} />
      {quote ? `: “${quote}”` : ''}
    </li>
  );
}

import Link from 'next/link';
import type { HistoryEntry as Entry } from '@/lib/contracts/sequence-pages';
import { HistoryPeople } from './history-people';
import { KeptDryRun } from './kept-dry-run';
import { RevisionState } from './revision-state';
import type { ReactNode } from 'react';

interface HistoryEntryProps {
  sequenceId: string;
  entry: Entry;
  actions: ReactNode;
}

/** One revision: its number and state, what changed and why, who and when, what can be done. */
export function HistoryEntry({ sequenceId, entry, actions }: HistoryEntryProps) {
  const { head, changes, comparedWith, lots, keptDryRuns } = entry;
  return (
    <li className="grid gap-x-8 gap-y-3 border-t border-hair py-4 first:border-t-2 first:border-ink lg:grid-cols-[150px_minmax(0,5fr)_minmax(0,4fr)]">
      <div>
        <h2 className="text-lead font-bold">r{head.number}</h2>
        <RevisionState head={head} />
      </div>
      <div className="grid content-start gap-2.5">
        {head.note ? <p>“{head.note}”</p> : null}
        <Changes changes={changes} comparedWith={comparedWith} />
        {Object.entries(head.warningReasons).map(([key, reason]) => (
          <p key={key} className="text-cap text-ink-2">
            A warning accepted: “{reason}”
          </p>
        ))}
        {keptDryRuns.map((view) => (
          <KeptDryRun key={view.id} sequenceId={sequenceId} view={view} />
        ))}
      </div>
      <div className="grid content-start gap-3">
        <div className="text-cap text-ink-2">
          <HistoryPeople head={head} />
        </div>
        {lots.length > 0 ? <Lots lots={lots} /> : null}
        <div className="flex flex-wrap items-center gap-x-4 gap-y-2">{actions}</div>
      </div>
    </li>
  );
}

function Changes({ changes, comparedWith }: Pick<Entry, 'changes' | 'comparedWith'>) {
  if (comparedWith === null) return <p className="text-ink-2">The first revision.</p>;
  if (changes.length === 0) return <p className="text-ink-2">The same steps as r{comparedWith}.</p>;
  return (
    <div>
      <p className="text-cap text-ink-2">Changed from r{comparedWith}</p>
      <ul className="grid gap-0.5">
        {changes.map((sentence) => (
          <li key={sentence}>{sentence}</li>
        ))}
      </ul>
    </div>
  );
}

const mostLots = 6;

function Lots({ lots }: Pick<Entry, 'lots'>) {
  const open = lots.filter(({ state }) => state !== 'closed');
  const more = lots.length - mostLots;
  return (
    <p className="text-cap">
      {lots.length === 1 ? 'Lot' : 'Lots'}{' '}
      {lots.slice(0, mostLots).map(({ code, state }, i) => (
        <span key={code}>
          {i > 0 ? ', ' : ''}
          <Link className="sw-link font-num" href={`/lots/${encodeURIComponent(code)}`}>
            {code}
          </Link>
          {state === 'closed' ? ' closed' : ''}
        </span>
      ))}
      {more > 0 ? ` and ${more} more` : ''}. {open.length === 0 ? 'None of them is open.' : ''}
    </p>
  );
}

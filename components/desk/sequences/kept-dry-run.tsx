import Link from 'next/link';
import type { DryRunView } from '@/lib/contracts/dry-run';
import { RunSentence } from '../dry-run/run-sentence';
import { count } from '../numbers';

/** A dry run that belongs to a revision, in its sentence. */
export function KeptDryRun({ sequenceId, view }: { sequenceId: string; view: DryRunView }) {
  return (
    <div>
      <p className="text-cap text-ink-2">
        Dry run of {count(view.settings.boards)} boards, kept by {view.askedBy}
      </p>
      {view.result ? <RunSentence view={view} result={view.result} /> : null}
      <Link className="sw-link text-cap" href={`/sequences/${sequenceId}/dry-runs/${view.id}`}>
        Open the dry run
      </Link>
    </div>
  );
}

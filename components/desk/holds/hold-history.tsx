import { EmptyState } from '@/components/ui/empty-state';
import type { LotHoldRow } from '@/lib/contracts/lot-holds-page';
import type { HoldCauseKind } from '@/lib/contracts/stored-states';
import { SignatureLine } from '../decisions/decision-record';
import { Time } from '../time';

const causeWords: Record<HoldCauseKind, string> = {
  person: 'by a person',
  'run-rule': 'by rule: a run on the chart',
  'yield-floor': 'by rule: first-pass yield',
  'same-reason': 'by rule: one reason in a row',
  'failed-check': 'by rule: a failed daily check',
};

/** Every hold of a lot, newest first: why, since when, and who released it with which words. */
export function HoldHistory({ holds }: { holds: readonly LotHoldRow[] }) {
  if (holds.length === 0) return <EmptyState title="The lot was never on hold." />;
  return (
    <ol>
      {holds.map(({ id, cause, reason, raisedByName, raisedIso, release }) => (
        <li key={id} className="grid gap-x-10 gap-y-2 border-b border-hair py-2.5 break-inside-avoid md:grid-cols-2">
          <div>
            <p className="text-ink-2">
              <Time iso={raisedIso} />, {raisedByName ?? causeWords[cause]}
            </p>
            <p>{reason}</p>
          </div>
          {release ? (
            <div>
              <p className="text-ink-2">
                Released <Time iso={release.iso} />
              </p>
              <p>{release.reason}</p>
              {release.signature ? <SignatureLine signature={release.signature} /> : null}
            </div>
          ) : (
            <p className="font-bold">Still on hold.</p>
          )}
        </li>
      ))}
    </ol>
  );
}

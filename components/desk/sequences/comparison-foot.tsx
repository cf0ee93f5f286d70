import type { ReactNode } from 'react';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { ComparisonPage } from '@/lib/contracts/sequence-pages';
import type { RevisionHead } from '@/lib/contracts/sequence-draft';
import { checkSequence } from '@/lib/sequence/check-sequence';
import { findingKey } from '@/lib/sequence/finding';
import { Time } from '../time';
import { KeptDryRun } from './kept-dry-run';

/** What else a release rests on: the kept dry run, the reason, the signatures. */
export function ComparisonFoot({ page }: { page: ComparisonPage }) {
  const { sequenceId, b, keptDryRun, mayRelease } = page;
  const { head } = b;
  return (
    <div className="mt-6 grid gap-x-11 gap-y-6 lg:grid-cols-3">
      <Column title="Dry run">
        {keptDryRun ? (
          <KeptDryRun sequenceId={sequenceId} view={keptDryRun} />
        ) : (
          <p className="text-ink-2">No dry run was kept with r{head.number}.</p>
        )}
      </Column>
      <Column title="Reason given">
        {head.note ? (
          <>
            <p>“{head.note}”</p>
            <p className="text-cap text-ink-2">
              {head.submittedBy ?? head.madeBy}, <Time iso={head.submittedAtIso ?? head.savedAtIso} />
            </p>
          </>
        ) : (
          <p className="text-ink-2">None yet: it is given when the draft is submitted.</p>
        )}
        {head.sentBackReason ? (
          <p>
            Sent back by {head.sentBackBy}: “{head.sentBackReason}”
          </p>
        ) : null}
        <Warnings page={page} />
      </Column>
      <Column title="Signatures, two needed">
        <Signatures head={head} mayRelease={mayRelease} />
      </Column>
    </div>
  );
}

/** What the rules say of the later one, with the reason that was given for it. */
function Warnings({ page: { b, boardType } }: { page: ComparisonPage }) {
  return checkSequence(b.sequence, boardType).map((finding) => {
    const reason = b.head.warningReasons[findingKey(finding)];
    return (
      <p key={findingKey(finding)} className="flex items-start gap-2">
        <VerdictMark shape={finding.severity === 'error' ? 'reject' : 'check'} size={15} />
        <span>
          {finding.sentence}{' '}
          {finding.severity === 'error'
            ? 'It cannot be released.'
            : reason
              ? `Accepted: “${reason}”`
              : 'No reason yet.'}
        </span>
      </p>
    );
  });
}

function Column({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="grid content-start gap-2 border-t-2 border-ink pt-2">
      <h2 className="font-bold">{title}</h2>
      {children}
    </section>
  );
}

function Signatures({ head, mayRelease }: { head: RevisionHead; mayRelease: boolean }) {
  const { submittedBy, submittedAtIso, releasedBy, releasedAtIso, releaseMeaning, status } = head;
  return (
    <ul className="grid">
      <SignatureLine done={submittedBy !== null && status !== 'draft'} iso={status === 'draft' ? null : submittedAtIso}>
        <b>{submittedBy ?? head.madeBy}</b>, written and submitted
      </SignatureLine>
      <SignatureLine done={releasedBy !== null} iso={releasedAtIso}>
        <b>{releasedBy ?? (mayRelease ? 'You' : 'Another engineer or quality')}</b>, checked and released
      </SignatureLine>
      <li className="pt-1.5 text-cap text-ink-2">
        {releaseMeaning ? `“${releaseMeaning}”` : 'Nobody releases what they wrote.'}
      </li>
    </ul>
  );
}

function SignatureLine({ done, iso, children }: { done: boolean; iso: string | null; children: ReactNode }) {
  return (
    <li className="flex items-center gap-2 border-b border-hair py-1.5">
      <VerdictMark shape={done ? 'pass' : 'check'} size={15} />
      <span className="grow">{children}</span>
      <span className="text-cap text-ink-2">{done && iso ? <Time iso={iso} /> : 'waits'}</span>
    </li>
  );
}

'use client';

import { VerdictMark } from '@/components/ui/verdict-mark';
import { blankKey, conflictKey, type Conflict } from '@/lib/sequence/draft';
import { giveReason, mend } from '@/lib/sequence/draft-edits';
import { isReason } from '@/lib/sequence/draft-problems';
import { findingKey, type SequenceFinding } from '@/lib/sequence/finding';
import { readBlank } from '@/lib/sequence/read-blank';
import type { Step } from '@/lib/sequence/step';
import type { SentenceField } from '@/lib/steps/step-kind';
import { kindOf } from '@/lib/steps/step-kinds';
import { messagesId } from './blank-ids';
import { ConflictLine } from './conflict-line';
import { useEditor } from './editor-context';

/** Under a step's sentence: texts that cannot be read, what the rules say, and choices between two texts, blank by blank. */
export function StepMessages({ step }: { step: Step }) {
  const { draft, findings } = useEditor();
  const own = findings.filter(({ stepId }) => stepId === step.id);
  const conflicts = draft.conflicts.filter((each) => 'stepId' in each && each.stepId === step.id);
  const blanks = kindOf(step)
    .sentence(step)
    .filter((part): part is SentenceField => typeof part !== 'string');
  const fields = [...new Set([...blanks.map(({ field }) => field), ...own.flatMap(({ field }) => field ?? [])])];
  const ofField = (field: string) => ({
    blank: blanks.find((each) => each.field === field),
    found: own.filter((finding) => finding.field === field),
    chosen: conflicts.filter((each) => each.kind === 'value' && each.field === field),
  });
  const spoken = (conflict: Conflict) => conflict.kind === 'value' && fields.includes(conflict.field);
  return (
    <>
      {fields.map((field) => {
        const { blank, found, chosen } = ofField(field);
        const unread = blank && draft.unread[blankKey(step.id, field)];
        if (unread === undefined && found.length === 0 && chosen.length === 0) return null;
        return (
          <div key={field} id={messagesId(step.id, field)} className="grid gap-1 pb-1">
            {unread === undefined ? null : <UnreadLine step={step} blank={blank!} text={unread} />}
            <FindingLines findings={found} />
            {chosen.map((each) => (
              <ConflictLine key={conflictKey(each)} conflict={each} />
            ))}
          </div>
        );
      })}
      <FindingLines findings={own.filter(({ field }) => field === null)} />
      {conflicts
        .filter((each) => !spoken(each))
        .map((each) => (
          <ConflictLine key={conflictKey(each)} conflict={each} />
        ))}
    </>
  );
}

function UnreadLine({ step, blank, text }: { step: Step; blank: SentenceField; text: string }) {
  const read = readBlank(step, blank, text);
  return read.ok ? null : <ErrorLine sentence={`${blank.label}: ${read.sentence}`} />;
}

export function ErrorLine({ sentence, children }: { sentence: string; children?: React.ReactNode }) {
  return (
    <p className="flex items-baseline gap-2 text-cap font-bold text-reject">
      <VerdictMark shape="reject" size={14} />
      <span>
        {sentence} {children}
      </span>
    </p>
  );
}

export function FindingLines({ findings }: { findings: readonly SequenceFinding[] }) {
  return findings.map((finding) =>
    finding.severity === 'error' ? (
      <ErrorLine key={findingKey(finding)} sentence={finding.sentence}>
        <Mend finding={finding} />
      </ErrorLine>
    ) : (
      <WarningLine key={findingKey(finding)} finding={finding} />
    ),
  );
}

function Mend({ finding: { mend: way } }: { finding: SequenceFinding }) {
  const { edit, locked } = useEditor();
  if (!way || locked) return null;
  return (
    <button
      type="button"
      onClick={() => edit((draft) => mend(draft, way.changes))}
      className="min-h-[25px] font-bold text-accent underline decoration-2 underline-offset-4 hover:bg-accent-wash max-sm:min-h-[46px]"
    >
      {way.label}
    </button>
  );
}

/** A warning may stand with a reason, which is kept with the revision. */
function WarningLine({ finding }: { finding: SequenceFinding }) {
  const { draft, edit, endGroup, locked } = useEditor();
  const key = findingKey(finding);
  const reason = draft.warningReasons[key] ?? '';
  return (
    <div className="grid gap-1 text-cap">
      <p className="flex items-baseline gap-2">
        <VerdictMark shape="check" size={14} />
        <span>
          {finding.sentence} <Mend finding={finding} />
        </span>
      </p>
      {locked ? (
        <p className="text-ink-2">{reason ? `Reason: ${reason}` : 'No reason given yet.'}</p>
      ) : (
        <label className="flex flex-wrap items-baseline gap-x-2 text-ink-2">
          It stays because
          <input
            data-blank=""
            value={reason}
            maxLength={300}
            placeholder={isReason(reason) ? undefined : 'reason, kept with the revision'}
            aria-label={`Reason: ${finding.sentence}`}
            onChange={({ target }) => edit((now) => giveReason(now, key, target.value), `reason/${key}`)}
            onBlur={endGroup}
            className="min-h-[30px] min-w-0 flex-1 basis-56 border-b-2 border-rule bg-sheet px-2 font-bold text-ink placeholder:font-normal placeholder:text-ink-3 max-sm:min-h-[46px]"
          />
        </label>
      )}
    </div>
  );
}

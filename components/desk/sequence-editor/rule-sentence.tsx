'use client';

import { useState } from 'react';
import { FillInChoice } from '@/components/ui/fill-in';
import { conflictKey, ruleFactorKey } from '@/lib/sequence/draft';
import { setRule, typeRuleFactor } from '@/lib/sequence/draft-edits';
import { readNumber } from '@/lib/sequence/read-blank';
import { ruleWords } from '@/lib/sequence/value-words';
import { blankId, messagesId } from './blank-ids';
import { blankFrame } from './blank-look';
import { ConflictLine } from './conflict-line';
import { useEditor } from './editor-context';
import { ErrorLine, FindingLines } from './step-messages';

const kinds = [
  { value: 'simple', label: 'the limits themselves' },
  { value: 'guard-band', label: 'limits drawn in by a guard band' },
];

/** How a result is judged, as a sentence over the steps; under it what the rules say of the whole sequence. */
export function RuleSentence() {
  const { draft, edit, locked, findings, comparison, releasedName } = useEditor();
  const { decisionRule: rule } = draft.sequence;
  const unread = draft.unread[ruleFactorKey];
  return (
    <div id="rule" className="relative border-b border-hair py-1 pl-3">
      {comparison?.rule ? (
        <span className="absolute inset-y-1 left-0 w-[5px] bg-ink">
          <span className="sr-only">changed since {releasedName}</span>
        </span>
      ) : null}
      <p className="leading-[38px] max-sm:leading-[52px]">
        A board passes against{' '}
        {locked ? (
          <b className="border-b-2 border-dashed border-ink-3">{ruleWords(rule)}</b>
        ) : (
          <>
            <FillInChoice
              label="Decision rule"
              data-blank=""
              className="leading-[26px] max-sm:leading-[42px]"
              choices={kinds}
              value={rule.kind}
              onChange={({ target }) =>
                edit((now) =>
                  setRule(now, target.value === 'simple' ? { kind: 'simple' } : { kind: 'guard-band', factor: 1 }),
                )
              }
            />
            {rule.kind === 'guard-band' ? (
              <>
                {' '}
                of <Factor factor={rule.factor} unread={unread} /> times the expanded uncertainty of the result
              </>
            ) : null}
          </>
        )}
        .{comparison?.rule ? <span className="text-cap text-ink-2"> (was {comparison.rule.from})</span> : null}
      </p>
      {unread === undefined ? null : (
        <div id={messagesId(null, 'factor')}>
          <ErrorLine sentence={`“${unread}” is not a factor. Enter a number from 0 to 3.`} />
        </div>
      )}
      <FindingLines findings={findings.filter(({ stepId }) => stepId === null)} />
      {draft.conflicts
        .filter(({ kind }) => kind === 'rule' || kind === 'reason')
        .map((each) => (
          <ConflictLine key={conflictKey(each)} conflict={each} />
        ))}
    </div>
  );
}

function Factor({ factor, unread }: { factor: number; unread: string | undefined }) {
  const { edit, endGroup } = useEditor();
  const [typing, setTyping] = useState<string | null>(null);
  const still = typing !== null && (unread === typing || (unread === undefined && readNumber(typing) === factor));
  const shown = still ? typing : (unread ?? String(factor));
  return (
    <input
      id={blankId(null, 'factor')}
      data-blank=""
      aria-label="Guard band, times the expanded uncertainty"
      aria-invalid={unread !== undefined || undefined}
      aria-describedby={unread === undefined ? undefined : messagesId(null, 'factor')}
      inputMode="decimal"
      autoComplete="off"
      value={shown}
      onChange={({ target }) => {
        setTyping(target.value);
        edit((now) => typeRuleFactor(now, target.value), ruleFactorKey);
      }}
      onBlur={() => {
        setTyping(null);
        endGroup();
      }}
      style={{ width: `${Math.max(3, shown.length) + 2}ch` }}
      className={`font-num font-bold ${blankFrame({ error: unread !== undefined, warning: false })}`}
    />
  );
}

import { Fragment } from 'react';
import type { StepComparison } from '@/lib/sequence/compare-sequences';
import type { Step } from '@/lib/sequence/step';
import { fieldValue } from '@/lib/sequence/field-value';
import { valueWords } from '@/lib/sequence/value-words';
import { kindOf } from '@/lib/steps/step-kinds';

interface ComparedSentenceProps {
  row: StepComparison;
  side: 'before' | 'after';
  /** Of the same side. */
  steps: readonly Step[];
}

const lines = { trip: 'border-trip', release: 'border-release', plain: 'border-ink' } as const;

/** A step's sentence; what differs is struck out on the one side and underlined on the other. */
export function ComparedSentence({ row, side, steps }: ComparedSentenceProps) {
  const step = row[side];
  if (!step) return <span className="text-ink-2">{side === 'before' ? 'not there' : 'removed'}</span>;
  const alone = row.before === null || row.after === null;
  const parts = kindOf(step).sentence(step);
  const spoken = parts.map((part) => (typeof part === 'string' ? '' : part.field));
  const unspoken = row.values.filter(({ field }) => !spoken.includes(field));
  const sentence = (
    <>
      {parts.map((part, i) => {
        if (typeof part === 'string') return <Fragment key={i}>{part}</Fragment>;
        const change = row.values.find(({ field }) => field === part.field);
        if (!change) return <Fragment key={i}>{valueWords(fieldValue(step, part.field), part, steps)}</Fragment>;
        return (
          <Mark side={side} key={i} text={side === 'before' ? change.from : change.to} tone={part.tone ?? 'plain'} />
        );
      })}
      {unspoken.map(({ field, label, from, to }) => (
        <Fragment key={field}>
          ; {label.toLowerCase()} <Mark side={side} text={side === 'before' ? from : to} tone="plain" />
        </Fragment>
      ))}
    </>
  );
  return (
    <>
      {alone && side === 'before' ? (
        <del className="text-ink-2">{sentence}</del>
      ) : alone ? (
        <ins>{sentence}</ins>
      ) : (
        sentence
      )}
      {!step.enabled && !row.switched ? <span className="text-ink-2"> (switched off)</span> : null}
      {row.switched ? (
        <>
          , <Mark side={side} text={step.enabled ? 'switched on' : 'switched off'} tone="plain" />
        </>
      ) : null}
      {row.moved ? (
        <>
          , <Mark side={side} text={`place ${side === 'before' ? row.placeBefore : row.placeAfter}`} tone="plain" />
        </>
      ) : null}
    </>
  );
}

function Mark({ side, text, tone }: { side: 'before' | 'after'; text: string; tone: keyof typeof lines }) {
  if (side === 'before') return <del className="whitespace-nowrap text-ink-2 decoration-2">{text}</del>;
  return (
    <ins className={`border-b-2 bg-sheet px-1 font-num font-bold whitespace-nowrap no-underline ${lines[tone]}`}>
      {text}
    </ins>
  );
}

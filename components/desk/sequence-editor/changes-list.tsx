'use client';

import Link from 'next/link';
import { stepWord } from '@/lib/sequence/value-words';
import type { StepComparison } from '@/lib/sequence/compare-sequences';
import { rowId } from './blank-ids';
import { useEditor } from './editor-context';

/** What differs from the revision in use, a line a value. */
export function ChangesList({ compareAddress }: { compareAddress: string }) {
  const { comparison, releasedName, select } = useEditor();
  if (!comparison || !releasedName) return null;
  const { rule } = comparison;
  const lines = comparison.steps.filter(({ changed }) => changed).flatMap(linesOf);
  return (
    <section aria-labelledby="changes-title" className="border-t-2 border-ink pt-2">
      <div className="flex items-baseline justify-between gap-4">
        <h2 id="changes-title" className="font-bold">
          Changed since {releasedName}
        </h2>
        <Link className="sw-link" href={compareAddress}>
          Compare
        </Link>
      </div>
      {comparison.same ? <p className="text-ink-2">Nothing yet.</p> : null}
      <table className="sw-table">
        <tbody>
          {rule ? (
            <tr>
              <td className="w-9" />
              <td>Decision rule</td>
              <td className="num">
                {rule.from} → {rule.to}
              </td>
            </tr>
          ) : null}
          {lines.map(({ key, stepId, place, label, from, to }) => (
            <tr key={key}>
              <td className="w-9">
                {place === null ? null : (
                  <a
                    className="sw-link font-num"
                    href={`#${rowId(stepId)}`}
                    aria-label={`Step ${place}`}
                    onClick={() => select(stepId)}
                  >
                    {place}
                  </a>
                )}
              </td>
              <td>{label}</td>
              <td className="num">{from === null ? to : `${from} → ${to}`}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}

interface ChangeLine {
  key: string;
  stepId: string;
  place: number | null;
  label: string;
  from: string | null;
  to: string;
}

function linesOf(step: StepComparison): ChangeLine[] {
  const { stepId, before, after, placeBefore, placeAfter } = step;
  const line = (label: string, from: string | null, to: string): ChangeLine => ({
    key: `${stepId}/${label}`,
    stepId,
    place: placeAfter,
    label,
    from,
    to,
  });
  if (!before) return [line(stepWord(after!), null, 'new')];
  if (!after) return [line(stepWord(before), null, `step ${placeBefore}, removed`)];
  return [
    ...(step.renamed ? [line('Name', stepWord(before), stepWord(after))] : []),
    ...(step.switched ? [line(stepWord(after), null, `switched ${step.switched}`)] : []),
    ...(step.moved ? [line(`${stepWord(after)}, place`, String(placeBefore), String(placeAfter))] : []),
    ...step.values.map(({ label, from, to }) => line(label, from, to)),
  ];
}

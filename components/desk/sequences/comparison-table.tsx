import { Table, Td, Th } from '@/components/ui/table';
import type { ComparisonPage } from '@/lib/contracts/sequence-pages';
import type { SequenceComparison, StepComparison } from '@/lib/sequence/compare-sequences';
import { ruleWords, stepWord } from '@/lib/sequence/value-words';
import { Time } from '../time';
import { ComparedSentence } from './compared-sentence';
import { revisionStateWords } from './revision-state';
import { ValueMove } from './value-move';

interface ComparisonTableProps {
  page: ComparisonPage;
  comparison: SequenceComparison;
  rows: readonly StepComparison[];
}

/** Steps of two revisions side by side; what differs is struck out left and underlined right. */
export function ComparisonTable({ page: { a, b }, comparison, rows }: ComparisonTableProps) {
  return (
    <Table aria-label={`Steps of r${a.head.number} and r${b.head.number}`} className="[&_td]:align-top [&_td]:py-2">
      <thead>
        <tr>
          <Th>
            <span className="sw-only-read">Step</span>
          </Th>
          {[a, b].map(({ head }, i) => (
            <Th key={i}>
              <b className="text-ink">r{head.number}</b>, {revisionStateWords(head)},{' '}
              <Time iso={head.releasedAtIso ?? head.savedAtIso} format={head.releasedAtIso ? 'day' : 'minute'} />
            </Th>
          ))}
          <Th>
            hollow: r{a.head.number}, solid: r{b.head.number}
          </Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <StepRow key={row.stepId} row={row} a={a} b={b} />
        ))}
        <tr className={comparison.rule ? '' : 'text-ink-2'}>
          <Td
            className={
              comparison.rule
                ? 'border-l-[5px] border-l-ink pl-3 font-bold'
                : 'border-l-[5px] border-l-transparent pl-3'
            }
          >
            Decision rule
          </Td>
          <Td label={`r${a.head.number}`}>
            {comparison.rule ? (
              <del className="decoration-2">{comparison.rule.from}</del>
            ) : (
              ruleWords(a.sequence.decisionRule)
            )}
          </Td>
          <Td label={`r${b.head.number}`} className={comparison.rule ? '' : 'max-sm:hidden!'}>
            {comparison.rule ? (
              <ins className="border-b-2 border-ink bg-sheet px-1 font-bold no-underline">{comparison.rule.to}</ins>
            ) : null}
          </Td>
          <Td>{comparison.rule ? null : 'the same'}</Td>
        </tr>
      </tbody>
    </Table>
  );
}

type Side = ComparisonPage['a'];

function StepRow({ row, a, b }: { row: StepComparison; a: Side; b: Side }) {
  const step = (row.after ?? row.before)!;
  const place = row.placeAfter ?? row.placeBefore;
  const bar = row.changed ? 'border-l-ink font-bold' : 'border-l-transparent';
  return (
    <tr className={row.changed ? '' : 'text-ink-2'}>
      <Td className={`border-l-[5px] pl-3 whitespace-nowrap ${bar}`}>
        <span>
          <span className="mr-3 inline-block w-6 text-right font-num">{place}</span>
          {row.renamed ? (
            <>
              <del className="font-normal text-ink-2">{stepWord(row.before!)}</del> {stepWord(step)}
            </>
          ) : (
            stepWord(step)
          )}
        </span>
      </Td>
      <Td label={`r${a.head.number}`}>
        <span>
          <ComparedSentence row={row} side="before" steps={a.sequence.steps} />
        </span>
      </Td>
      <Td label={`r${b.head.number}`} className={row.changed ? '' : 'max-sm:hidden!'}>
        {row.changed ? (
          <span>
            <ComparedSentence row={row} side="after" steps={b.sequence.steps} />
          </span>
        ) : null}
      </Td>
      <Td>
        {row.changed ? (
          <span className="grid gap-1">
            {row.values.map((change) => (
              <ValueMove key={change.field} change={change} />
            ))}
            {row.before && row.after ? null : <b>{row.before ? 'removed' : 'new'}</b>}
          </span>
        ) : (
          'the same'
        )}
      </Td>
    </tr>
  );
}

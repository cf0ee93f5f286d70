'use client';

import { useRef } from 'react';
import { quantityLooks, valueText } from '@/components/charts/quality/quantity-look';
import { Strips } from '@/components/charts/quality/strips';
import { useElementWidth } from '@/components/charts/quality/use-element-width';
import { FillInChoice } from '@/components/ui/fill-in';
import { Table, Td, Th } from '@/components/ui/table';
import type { LotReview } from '@/lib/contracts/lot-review';
import { count } from '../../numbers';
import type { LotSectionProps } from '../lot-section';
import { comparisonWords } from './comparison-words';
import { SaveButtons } from './save-buttons';

type ComparisonPanelProps = Pick<LotSectionProps, 'view' | 'changeView' | 'lot'> & { review: LotReview };

/** Boards by station, operator, batch or hour, side by side, and whether they differ. */
export function ComparisonPanel({ review, view, changeView, lot }: ComparisonPanelProps) {
  const [frame, width] = useElementWidth<HTMLDivElement>(640);
  const svg = useRef<SVGSVGElement>(null);
  const { comparison, factors, quantity } = review;
  const label = factors.find(({ value }) => value === comparison.factor)?.label ?? '';
  const { name } = quantityLooks[quantity];
  return (
    <div ref={frame}>
      <div className="flex flex-wrap items-center justify-between gap-2 text-ink-2">
        <span className="flex flex-wrap items-center gap-2">
          Compare{' '}
          <FillInChoice
            label="What is compared"
            choices={factors}
            value={comparison.factor}
            onChange={(event) => changeView({ compare: event.target.value })}
          />
        </span>
        {view.as === 'charts' ? (
          <SaveButtons
            svg={svg}
            name={`lot-${lot.code}-${quantity}-by-${comparison.factor.replace(/\W+/g, '-')}`}
            what="the comparison"
          />
        ) : null}
      </div>
      <p className="mt-2">{comparisonWords(review)}</p>
      {comparison.groups.length === 0 ? null : view.as === 'charts' ? (
        <Strips review={review} width={width} label={`${name} by ${label}`} ref={svg} />
      ) : (
        <Table stacks={false} aria-label={`${name} by ${label}`} className="mt-2">
          <thead>
            <tr>
              <Th>Group</Th>
              <Th number>Boards</Th>
              <Th number>Mean</Th>
              <Th number>Standard deviation</Th>
            </tr>
          </thead>
          <tbody>
            {comparison.groups.map((group) => (
              <tr key={group.label}>
                <Td>{group.label}</Td>
                <Td number>{count(group.boards)}</Td>
                <Td number>{valueText(quantity, group.mean)}</Td>
                <Td number>{group.deviation === null ? '–' : valueText(quantity, group.deviation)}</Td>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
      <p className="mt-1 text-cap text-ink-2">
        One-way analysis of variance of first-attempt values, a stroke a board.
      </p>
    </div>
  );
}

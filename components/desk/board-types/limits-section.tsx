'use client';

import { Section } from '@/components/ui/page-head';
import { absoluteMaximumField, limitRows } from '@/lib/board-type/fields';
import { LimitTable } from './limit-table';
import { QuantityRow } from './quantity-row';

export function LimitsSection() {
  return (
    <Section title="Limits" aside={<span className="text-cap text-ink-2">Quality approves every change.</span>}>
      <LimitTable caption="Limits" rows={limitRows} />
      <div className="mt-4">
        <QuantityRow
          name="Absolute maximum supply, never exceeded at the board, overshoot included"
          fields={[absoluteMaximumField]}
        />
      </div>
    </Section>
  );
}

'use client';

import { Section } from '@/components/ui/page-head';
import { searchRows, thresholdAmpsField, thresholdVoltsField } from '@/lib/board-type/fields';
import { ChoiceLine } from './choice-line';
import { useBoardTypeForm } from './form-context';
import { LimitTable } from './limit-table';
import { QuantityRow } from './quantity-row';

/** How the output's state is told, and where its changes are looked for. */
export function SearchSection() {
  const { form, change } = useBoardTypeForm();
  return (
    <Section title="How the station finds the points">
      <div className="mb-5 grid grid-cols-[repeat(auto-fit,minmax(240px,1fr))] gap-6">
        <ChoiceLine
          legend="The output counts as on by"
          name="sensing"
          value={form.sensing}
          choices={[
            { value: 'output-voltage', label: 'its voltage, channel 102' },
            { value: 'load-current', label: 'the supply current with the load' },
          ]}
          onChoose={(sensing) => change({ sensing })}
        />
        <QuantityRow
          name="On above"
          fields={[form.sensing === 'output-voltage' ? thresholdVoltsField : thresholdAmpsField]}
        />
      </div>
      <LimitTable caption="Search ranges" rows={searchRows} />
    </Section>
  );
}

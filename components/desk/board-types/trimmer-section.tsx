'use client';

import { Section } from '@/components/ui/page-head';
import { travelFields } from '@/lib/board-type/fields';
import { ChoiceLine } from './choice-line';
import { useBoardTypeForm } from './form-context';
import { QuantityRow } from './quantity-row';

export function TrimmerSection() {
  const { form, change } = useBoardTypeForm();
  const { backlash } = travelFields(form.travelUnit);
  return (
    <Section
      title="Trimmer"
      aside={<span className="text-cap text-ink-2">Its resistance and travel stand in the circuit.</span>}
    >
      <div className="grid grid-cols-[repeat(auto-fit,minmax(210px,1fr))] gap-6">
        <ChoiceLine
          legend="Travel is spoken of in"
          name="travel-unit"
          value={form.travelUnit}
          choices={[
            { value: 'turns', label: 'turns, of a multi-turn trimmer' },
            { value: 'degrees', label: 'degrees, of a single-turn trimmer' },
          ]}
          onChoose={(travelUnit) => change({ travelUnit })}
        />
        <ChoiceLine
          legend="Turned clockwise, the trip point"
          name="clockwise"
          value={form.clockwise}
          choices={[
            { value: 'raises', label: 'rises' },
            { value: 'lowers', label: 'falls' },
          ]}
          onChoose={(clockwise) => change({ clockwise })}
        />
        <QuantityRow name="Backlash: after a reversal nothing moves for" fields={[backlash]} />
      </div>
    </Section>
  );
}

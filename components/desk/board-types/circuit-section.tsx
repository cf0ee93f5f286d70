'use client';

import { Section } from '@/components/ui/page-head';
import { undrawnParts } from '@/lib/board-type/fields';
import { QuantityRow } from './quantity-row';
import { Schematic } from './schematic/schematic';

export function CircuitSection() {
  return (
    <Section
      title="Circuit"
      aside={<span className="text-cap text-ink-2">Values and tolerances drive the prediction.</span>}
    >
      <Schematic />
      <div className="mt-3 grid grid-cols-[repeat(auto-fill,minmax(190px,1fr))] gap-x-4 gap-y-3 border-t border-hair pt-3">
        {undrawnParts.map(({ id, name, fields }) => (
          <QuantityRow key={id} name={name} fields={fields} />
        ))}
      </div>
    </Section>
  );
}

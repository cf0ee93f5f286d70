import { Section } from '@/components/ui/page-head';
import { ComponentBatches } from './component-batches';
import type { LotSectionProps } from './lot-section';

export function LotComponentsSection({ lot, may, actions, onChanged }: LotSectionProps) {
  return (
    <Section title="Component batches">
      <ComponentBatches
        lotId={lot.id}
        batches={lot.components}
        record={may.manage && lot.state !== 'closed' ? actions.recordBatch : null}
        onChanged={onChanged}
      />
    </Section>
  );
}

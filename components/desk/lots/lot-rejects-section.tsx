import { Section } from '@/components/ui/page-head';
import { RejectPareto } from './reject-pareto';
import type { LotSectionProps } from './lot-section';

/** Why boards were rejected, and the rejected boards beside it. */
export function LotRejectsSection({ lot }: LotSectionProps) {
  return (
    <Section title="Why boards were rejected">
      <RejectPareto reasons={lot.summary.reasons} />
    </Section>
  );
}

import { Section } from '@/components/ui/page-head';
import type { LotReview } from '@/lib/contracts/lot-review';
import type { LotSectionProps } from './lot-section';
import { CapabilityPanel } from './review/capability-panel';
import { ComparisonPanel } from './review/comparison-panel';
import { RuleSwitches } from './review/rule-switches';
import { YieldsPanel } from './review/yields-panel';

/** What follows from the chart: capability, rules, comparisons; and the yields of the lot. */
export function LotFiguresSection({ review, lot, view, changeView }: LotSectionProps & { review: LotReview }) {
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-x-12 lg:grid-cols-[repeat(2,minmax(0,1fr))]">
      <Section title="Run rules">
        <RuleSwitches review={review} view={view} changeView={changeView} />
      </Section>
      <Section title="Capability">
        <CapabilityPanel review={review} />
      </Section>
      <Section title="Who and what differs">
        <ComparisonPanel review={review} lot={lot} view={view} changeView={changeView} />
      </Section>
      <Section title="Yields">
        <YieldsPanel review={review} view={view} changeView={changeView} />
      </Section>
    </div>
  );
}

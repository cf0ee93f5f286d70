import { Section } from '@/components/ui/page-head';
import { LotRejectTable } from '../decisions/lot-reject-table';
import type { LotSectionProps } from './lot-section';
import { RejectPareto } from './reject-pareto';

/** Why boards were rejected, and beside it those that wait for a decision. */
export function LotRejectsSection({ lot, deciding, onChanged }: LotSectionProps) {
  const { summary } = lot;
  const boards = summary.rejected + summary.undecided;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-x-12 xl:grid-cols-[minmax(0,10fr)_minmax(0,27fr)]">
      <Section title="Why boards were rejected">
        <RejectPareto reasons={summary.reasons} />
      </Section>
      {boards > 0 ? (
        <Section title="Boards to decide about">
          <LotRejectTable
            lotCode={lot.code}
            version={`${summary.marks} ${summary.undecided} ${summary.runsWithoutVerdict}`}
            deciding={deciding}
            onChanged={onChanged}
          />
        </Section>
      ) : null}
    </div>
  );
}

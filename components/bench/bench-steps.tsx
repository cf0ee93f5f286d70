import { useTranslations } from 'next-intl';
import { StepLine, type StepLineItem } from '../ui/step-line';
import { useBench } from './bench-context';
import type { BenchView } from '@/lib/contracts/bench-view';

const shiftSteps = ['badge', 'pin', 'ready'] as const;

/** The steps of the run, of the next run, or of the start of a shift. */
export function BenchSteps() {
  const t = useTranslations('bench.steps');
  const { view } = useBench();
  const groups = view.run?.stepGroups ?? view.next?.stepGroups.map((group) => ({ group, state: 'ahead' as const }));
  const at = shiftStep(view);
  const steps: StepLineItem[] =
    at === null && groups
      ? groups.map(({ group, state }) => ({ key: group, label: t(`groups.${group}`), state }))
      : shiftSteps.map((step, i) => {
          const state = at === null || i < at ? 'done' : i === at ? 'current' : 'ahead';
          return { key: step, label: t(`shift.${step}`), state };
        });
  return <StepLine steps={steps} label={t('label')} />;
}

/** Which step of the start of a shift is on; null once it is over. */
function shiftStep({ screen, operator }: BenchView): number | null {
  if (screen.kind === 'badge') return 0;
  if (screen.kind === 'pin') return 1;
  if (screen.kind === 'may-not-test' || screen.kind === 'choose-lot') return 2;
  return operator ? null : 0;
}

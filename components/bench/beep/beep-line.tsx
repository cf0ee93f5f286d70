import { useTranslations } from 'next-intl';
import { StepLine, type StepLineItem } from '../../ui/step-line';

/** Two places on a short step line: the awaited beep between jaws, the heard one with tick and thick base. */
export function BeepLine({ heard }: { heard: 0 | 1 | 2 }) {
  const t = useTranslations('bench.trim');
  const steps = ([1, 2] as const).map((number): StepLineItem => {
    const state = number <= heard ? 'done' : number === heard + 1 ? 'current' : 'ahead';
    return { key: `${number}`, label: t('beep', { number }), state };
  });
  return (
    <div className="sw-beep-line">
      <StepLine steps={steps} label={t('beeps')} />
    </div>
  );
}

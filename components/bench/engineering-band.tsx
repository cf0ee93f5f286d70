import { useTranslations } from 'next-intl';
import { TrialMark } from '../ui/trial-mark';
import { useBench } from './bench-context';

/** Over every screen of a trial: what is measured here is no production. */
export function EngineeringBand() {
  const t = useTranslations('bench.engineering');
  const { engineering } = useBench().view;
  if (!engineering) return null;
  const { revision, sequenceName } = engineering;
  return (
    <p
      data-part="engineering"
      className="flex min-h-11 flex-none items-center gap-6 bg-ink px-12 py-0.5 text-b-label leading-tight text-paper max-[900px]:gap-3 max-[900px]:px-5"
    >
      <TrialMark size="calc(36 * var(--sw-b))" />
      <b>{t('band')}</b>
      <span className="max-[900px]:hidden">{t('draft', { revision, sequence: sequenceName })}</span>
    </p>
  );
}

import { useTranslations } from 'next-intl';
import type { ReactNode } from 'react';
import type { TrialOffer } from '@/lib/contracts/bench-view';

/** Instead of the lot: for whom the trial is, and what it is not. */
export function TrialFoot({ trial }: { trial: TrialOffer }) {
  const t = useTranslations('bench.engineering');
  const bold = (chunks: ReactNode) => <b className="text-ink">{chunks}</b>;
  return (
    <p className="text-b-label leading-snug whitespace-pre-line text-ink-2">
      {t.rich('foot', { name: trial.offeredBy, b: bold })}
    </p>
  );
}

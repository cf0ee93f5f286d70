import { useTranslations } from 'next-intl';
import type { ReactNode } from 'react';
import { Button } from '../ui/button';
import { TrialMark } from '../ui/trial-mark';
import { useBench } from './bench-context';

/** Who offers what for a trial, and the act that starts it. Nothing runs by itself. */
export function OfferPanel() {
  const t = useTranslations('bench.offer');
  const { view, send, leads } = useBench();
  const { offer } = view;
  if (!offer) return null;
  const { offerId, offeredBy, revision, sequenceName, note } = offer;
  const bold = (chunks: ReactNode) => <b>{chunks}</b>;
  return (
    <section
      role="status"
      data-part="offer"
      className="flex flex-none items-center gap-7 border-4 border-dashed border-ink bg-well px-7 py-4 text-b-label leading-snug max-[900px]:flex-wrap"
    >
      <TrialMark size="calc(56 * var(--sw-b))" />
      <p className="min-w-0 flex-1">
        {t.rich('offers', { name: offeredBy, revision, sequence: sequenceName, b: bold })}
        <span className="line-clamp-2 text-ink-2">{note || t('consequence')}</span>
      </p>
      {leads && (
        <Button
          size="bench"
          className="flex-none max-[900px]:w-full"
          onClick={() => send({ kind: 'start-trial', offerId })}
        >
          {t('start')}
        </Button>
      )}
    </section>
  );
}

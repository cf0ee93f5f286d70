import { useTranslations } from 'next-intl';

/** A further screen of the same station: it sees everything and can do nothing. */
export function WatcherBand() {
  const t = useTranslations('bench.watcher');
  return (
    <p
      role="status"
      data-part="watcher"
      className="flex-none border-b-4 border-dashed border-ink bg-well px-12 py-3 text-b-line leading-tight font-bold"
    >
      {t('title')} <span className="font-normal text-ink-2">{t('text')}</span>
    </p>
  );
}

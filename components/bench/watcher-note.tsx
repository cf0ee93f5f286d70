import { useTranslations } from 'next-intl';

/** A further screen of the same station sees everything and can do nothing: said where the actions would stand. */
export function WatcherNote() {
  const t = useTranslations('bench.watcher');
  return (
    <p
      role="status"
      data-part="watcher"
      className="min-h-(--sw-bench-button) max-w-160 flex-none border-4 border-dashed border-ink bg-well px-7 py-3 text-b-label leading-tight"
    >
      <b className="block text-b-line">{t('title')}</b>
      {t('text')}
    </p>
  );
}

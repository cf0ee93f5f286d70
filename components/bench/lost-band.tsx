import { useTranslations } from 'next-intl';

/** The whole width, striped: nothing on this screen is certain until the server answers again. */
export function LostBand() {
  const t = useTranslations('bench.lost');
  return (
    <div
      role="alert"
      data-part="lost"
      className="absolute inset-x-0 top-0 z-30 flex min-h-50 items-stretch bg-attn text-on-attn"
    >
      <div className="w-40 flex-none bg-[repeating-linear-gradient(-45deg,var(--sw-on-attn)_0_calc(16*var(--sw-b)),var(--sw-attn)_calc(16*var(--sw-b))_calc(40*var(--sw-b)))]" />
      <div className="flex flex-col justify-center px-10 py-6">
        <p className="text-b-next leading-tight font-extrabold">{t('title')}</p>
        <p className="text-b-line leading-snug font-bold">{t('text')}</p>
      </div>
    </div>
  );
}

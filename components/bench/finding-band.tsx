import { useTranslations } from 'next-intl';
import type { TrimFinding, TrimView } from '@/lib/trim/types';
import { Fitted } from './fitted';
import { useNumbers } from './use-numbers';

/** Amber band of 150 px: triangle, a title of two words, the measured fact. No flash and no tone. */
export function FindingBand({ finding, trim }: { finding: TrimFinding; trim: TrimView }) {
  const t = useTranslations('bench.findings');
  const { volts, whole } = useNumbers();
  const amount = trim.findingVolts ?? 0;
  const fact = t(`${finding}.fact`, {
    amount: finding === 'no-effect' ? whole(amount) : volts(Math.abs(amount)),
    trip: trim.lastTripVolts === null ? '' : volts(trim.lastTripVolts),
    rounds: trim.round,
  });
  return (
    <div
      role="status"
      className="flex min-h-37.5 flex-none items-center max-[900px]:flex-wrap gap-8 bg-attn px-12 py-3 text-on-attn"
    >
      <BandTriangle size={110} />
      <Fitted text={t(`${finding}.title`)} most={98} width={540} as="h2" className="flex-none !font-extrabold" />
      <p className="text-b-line leading-tight font-bold">{fact}</p>
    </div>
  );
}

/** The check triangle on amber. `size` in pixels of the bench drawing. */
export function BandTriangle({ size }: { size: number }) {
  return (
    <svg
      viewBox="0 0 202 182"
      aria-hidden="true"
      className="h-auto flex-none"
      style={{ width: `calc(${size} * var(--sw-b))` }}
    >
      <path d="M101 0 202 182H0Z" fill="var(--sw-on-attn)" />
      <path d="M90 62h22v62H90zM90 138h22v20H90z" fill="var(--sw-attn)" />
    </svg>
  );
}

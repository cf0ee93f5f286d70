import { useTranslations } from 'next-intl';

export type Caution = 'supply-off' | 'esd' | 'eyes' | 'batteries' | 'site-rules';

/** The usual cautions of work on live circuits, in one small paragraph. They defer to the site's own rules. */
export function Cautions({ which, className = '' }: { which: readonly Caution[]; className?: string }) {
  const t = useTranslations('bench.cautions');
  return <p className={`text-b-scale leading-snug text-ink-2 ${className}`}>{which.map((key) => t(key)).join(' ')}</p>;
}

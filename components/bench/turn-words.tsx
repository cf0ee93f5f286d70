import { useTranslations } from 'next-intl';
import type { TurnWords } from '@/lib/trim/types';

/** Lowest terms of eighths. */
export function fractionOf(eighths: number): [number, number] | null {
  if (eighths === 0) return null;
  if (eighths === 4) return [1, 2];
  return eighths % 2 === 0 ? [eighths / 2, 4] : [eighths, 8];
}

/** The number of turns as large as the size around it: whole turns with a stacked fraction, or degrees. */
export function TurnNumber({ words }: { words: TurnWords }) {
  const t = useTranslations('bench.trim');
  const label = useTurnText()(words);
  if (words.unit === 'degrees')
    return (
      <span aria-label={label} role="img" className="leading-[0.8] font-extrabold tracking-tight">
        {t('degrees', { degrees: words.degrees })}
      </span>
    );
  const fraction = fractionOf(words.eighths);
  return (
    <span aria-label={label} role="img" className="inline-flex items-center gap-[0.09em] leading-[0.8] font-extrabold">
      {words.whole > 0 || !fraction ? <span>{words.whole}</span> : null}
      {fraction && (
        <span className="sw-frac">
          <span>{fraction[0]}</span>
          <i />
          <span>{fraction[1]}</span>
        </span>
      )}
    </span>
  );
}

/** The same in one line, such as "1 3/4". */
export function useTurnText(): (words: TurnWords) => string {
  const t = useTranslations('bench.trim');
  return (words) => {
    if (words.unit === 'degrees') return t('degrees', { degrees: words.degrees });
    const fraction = fractionOf(words.eighths);
    const parts = [words.whole > 0 || !fraction ? `${words.whole}` : null, fraction ? fraction.join('/') : null];
    return parts.filter(Boolean).join(' ');
  };
}

/** Whether "turn" or "turns" follows the number; degrees say it themselves. */
export function isOneTurn(words: TurnWords): boolean {
  return words.unit === 'turns' && (words.whole === 0 || (words.whole === 1 && words.eighths === 0));
}

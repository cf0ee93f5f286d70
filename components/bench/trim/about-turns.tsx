import { useTranslations } from 'next-intl';
import type { TurnWords } from '@/lib/trim/types';
import { TurnNumber } from '../turn-words';

/** "about 1¾": the beep decides, not the number. */
export function AboutTurns({ words }: { words: TurnWords }) {
  const t = useTranslations('bench.trim');
  return (
    <p className="flex items-center gap-9 font-bold text-accent">
      <span className="text-[calc(60*var(--sw-b))]">{t('about')}</span>
      <span className="text-[calc(200*var(--sw-b))] leading-none">
        <TurnNumber words={words} />
      </span>
    </p>
  );
}

import { useTranslations } from 'next-intl';
import { serialGroups } from '@/lib/barcode/serial-groups';
import type { Say } from '@/lib/contracts/bench-view';
import { VerdictMark } from '../ui/verdict-mark';
import { useSay } from './use-say';

/** Why a scan or a press was refused, over the foot of the screen, beside what was tried. */
export function RefusalBand({ refusal, serial }: { refusal: Say; serial: string | null }) {
  const t = useTranslations('bench.refusal');
  const say = useSay();
  return (
    <div
      role="alert"
      data-part="refusal"
      className="absolute inset-x-0 bottom-full z-10 flex min-h-26 items-center gap-8 border-t-4 border-ink bg-attn px-12 py-4 text-b-line leading-tight font-bold text-on-attn"
    >
      <VerdictMark shape="check" size="1.5em" />
      {serial && (
        <span className="font-num whitespace-nowrap" aria-label={t('tried', { serial })}>
          {serialGroups(serial).at(-1)}
        </span>
      )}
      <span>{say(refusal)}</span>
    </div>
  );
}

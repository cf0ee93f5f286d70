import { useTranslations } from 'next-intl';
import type { ReactNode } from 'react';
import type { LotStrip } from '@/lib/contracts/bench-view';
import { LotRule } from '../ui/lot-rule';
import { useNumbers } from './use-numbers';

/** The lot in one sentence, over its rule. */
export function LotFoot({ lot, ending }: { lot: LotStrip; ending?: ReactNode }) {
  const t = useTranslations('bench.lot');
  const { whole } = useNumbers();
  const current = lot.marks.indexOf('C');
  const bold = (chunks: ReactNode) => <b className="font-num text-ink">{chunks}</b>;
  return (
    <div className="max-w-295 max-[900px]:max-w-none">
      <p className="flex flex-wrap gap-x-9 text-b-label leading-tight text-ink-2">
        <span>
          {current >= 0
            ? t.rich('board', { board: whole(current + 1), size: whole(lot.size), b: bold })
            : t.rich('tested', { tested: whole(lot.tested), size: whole(lot.size), b: bold })}
        </span>
        <span>{t.rich('rejected', { count: lot.rejected, b: bold })}</span>
        <span>{ending ?? <Pace lot={lot} running={current >= 0} />}</span>
      </p>
      <LotRule marks={lot.marks} label={t('aria', { tested: lot.tested, size: lot.size, rejected: lot.rejected })} />
    </div>
  );
}

/** Seconds a board during a run, minutes left between runs. */
function Pace({ lot, running }: { lot: LotStrip; running: boolean }) {
  const t = useTranslations('bench.lot');
  const { whole } = useNumbers();
  if (lot.secondsEach === null) return null;
  const bold = (chunks: ReactNode) => <b className="font-num text-ink">{chunks}</b>;
  if (running) return t.rich('secondsEach', { seconds: whole(lot.secondsEach), b: bold });
  const minutes = Math.ceil(((lot.size - lot.tested) * lot.secondsEach) / 60);
  return t.rich('minutesLeft', { minutes: whole(minutes), b: bold });
}

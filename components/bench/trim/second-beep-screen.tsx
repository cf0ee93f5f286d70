import { useTranslations } from 'next-intl';
import type { TrimView } from '@/lib/trim/types';
import { BeepLine } from '../beep/beep-line';
import { BenchFooter } from '../bench-footer';
import { TrimDial } from '../dial/trim-dial';
import { Fitted } from '../fitted';
import { Panes } from '../panes';
import { isOneTurn, TurnNumber } from '../turn-words';
import { StripPane } from './strip-pane';
import { TrimActions } from './trim-actions';

/** Now slowly: the supply is held at the target, the second beep says that the board is there. */
export function SecondBeepScreen({ trim }: { trim: TrimView }) {
  const t = useTranslations('bench.trim');
  const { direction, turns, words } = trim;
  return (
    <>
      <Panes wide left={<StripPane trim={trim} />}>
        <div className="flex h-full flex-col justify-between gap-3 px-9 pt-8 pb-5">
          <div className="text-accent">
            <Fitted as="h1" text={t('nowSlowly')} most={124} width={760} />
            <Fitted as="h2" text={t('stopAtSecond')} most={66} width={760} className="mt-4 !leading-[1.06]" />
          </div>
          {direction && turns !== null && words && (
            <div className="flex min-h-0 items-center gap-9">
              <div className="w-81 flex-none">
                <TrimDial direction={direction} turns={turns} labelled={false} />
              </div>
              <div className="grid gap-4 font-bold text-accent">
                <p className="text-[calc(50*var(--sw-b))] leading-tight">
                  {t('directionAbout', { direction: t(`directions.${direction}`).toLowerCase() })}
                </p>
                <p className="text-[calc(120*var(--sw-b))] leading-none">
                  <TurnNumber words={words} />
                </p>
                {words.unit === 'turns' && (
                  <p className="text-[calc(50*var(--sw-b))] leading-tight">{t(isOneTurn(words) ? 'turn' : 'turns')}</p>
                )}
              </div>
            </div>
          )}
          <BeepLine heard={1} />
        </div>
      </Panes>
      <BenchFooter actions={<TrimActions endTest />} />
    </>
  );
}

import { useTranslations } from 'next-intl';
import type { TrimView } from '@/lib/trim/types';
import { BenchFooter } from '../bench-footer';
import { useBench } from '../bench-context';
import { TrimDial } from '../dial/trim-dial';
import { Fitted } from '../fitted';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { isOneTurn, TurnNumber } from '../turn-words';
import { DialBesideWords } from './dial-beside-words';
import { StripPane } from './strip-pane';
import { TrimActions } from './trim-actions';
import { trimInside } from './trim-inside';

/** Which way and how far; near the target the strip shows what the full rails cannot. */
export function PromptedScreen({ trim }: { trim: TrimView }) {
  const t = useTranslations('bench.trim');
  const { view } = useBench();
  const { direction, turns, words } = trim;
  if (!direction || turns === null || !words) return null;
  const near = turns <= 0.25 && (trim.liveTripVolts ?? trim.lastTripVolts) !== null && view.run !== null;
  const counts = trim.liveTripVolts !== null;
  return (
    <>
      <Panes wide={near} left={near ? <StripPane trim={trim} /> : <RailsPane inside={trimInside(trim)} />}>
        {near ? (
          <NearTarget trim={trim} />
        ) : (
          <DialBesideWords
            direction={direction}
            dial={<TrimDial direction={direction} turns={turns} />}
            words={
              <div className="flex h-full flex-col justify-between gap-2 py-4 text-accent">
                <Fitted as="h1" text={t(`directions.${direction}`)} most={104} width={556} />
                <p
                  className={`leading-[0.84] ${words.unit === 'degrees' ? 'text-[calc(236*var(--sw-b))]' : 'text-b-turns'}`}
                >
                  <TurnNumber words={words} />
                </p>
                {words.unit === 'turns' && (
                  <Fitted text={t(isOneTurn(words) ? 'turn' : 'turns')} most={104} width={556} />
                )}
                <p className="text-b-line leading-[1.3] text-ink">{t(counts ? 'countsDown' : 'thenLetGo')}</p>
              </div>
            }
          />
        )}
      </Panes>
      <BenchFooter actions={<TrimActions endTest={false} />} />
    </>
  );
}

function NearTarget({ trim }: { trim: TrimView }) {
  const t = useTranslations('bench.trim');
  const { direction, turns, words } = trim;
  return (
    <div className="flex h-full flex-col justify-between gap-4 px-9 py-8 text-accent">
      <Fitted as="h1" text={t('nowSlowly')} most={120} width={760} />
      <Fitted as="h2" text={t(`directions.${direction!}`)} most={76} width={760} />
      <div className="flex min-h-0 flex-1 items-center gap-9">
        <div className="w-78 flex-none">
          <TrimDial direction={direction!} turns={turns!} labelled={false} />
        </div>
        <p className="text-[calc(150*var(--sw-b))] leading-none">
          <TurnNumber words={words!} />
        </p>
      </div>
      <p className="text-b-line text-ink">{t(trim.liveTripVolts === null ? 'thenLetGo' : 'countsDown')}</p>
    </div>
  );
}

import { useTranslations } from 'next-intl';
import type { TrimView } from '@/lib/trim/types';
import { BeepLine } from '../beep/beep-line';
import { BenchFooter } from '../bench-footer';
import { TrimDial } from '../dial/trim-dial';
import { Fitted } from '../fitted';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { DialBesideWords } from './dial-beside-words';
import { AboutTurns } from './about-turns';
import { TrimActions } from './trim-actions';
import { heldReading, trimInside } from './trim-inside';

/** Turn briskly until the board answers. */
export function FirstBeepScreen({ trim }: { trim: TrimView }) {
  const t = useTranslations('bench.trim');
  const { direction, turns, words } = trim;
  if (!direction || turns === null || !words) return null;
  return (
    <>
      <Panes left={<RailsPane showsTarget inside={trimInside(trim)} fixed={heldReading(trim)} />}>
        <DialBesideWords
          direction={direction}
          dial={<TrimDial direction={direction} turns={turns} />}
          words={
            <div className="flex h-full flex-col justify-between gap-3 py-3">
              <div className="text-accent">
                <Fitted as="h1" text={t(`directions.${direction}`)} most={104} width={556} />
                <Fitted as="h2" text={t('untilBeep')} most={86} width={556} className="mt-3" />
              </div>
              <AboutTurns words={words} />
              <p className="text-b-line leading-[1.3]">{t('briskly')}</p>
              <BeepLine heard={0} />
            </div>
          }
        />
      </Panes>
      <BenchFooter actions={<TrimActions endTest />} />
    </>
  );
}

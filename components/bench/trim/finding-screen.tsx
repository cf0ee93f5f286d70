import { useTranslations } from 'next-intl';
import type { TrimFinding, TrimView } from '@/lib/trim/types';
import { BeepLine } from '../beep/beep-line';
import { BenchFooter } from '../bench-footer';
import { TrimDial } from '../dial/trim-dial';
import { FindingBand } from '../finding-band';
import { Fitted } from '../fitted';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { AboutTurns } from './about-turns';
import { TrimActions } from './trim-actions';
import { heldReading, trimInside } from './trim-inside';

/** What went wrong with the turning, as measured; then the next move at full size. */
export function FindingScreen({ trim, finding }: { trim: TrimView; finding: TrimFinding }) {
  const t = useTranslations('bench');
  const { direction, turns, words } = trim;
  const beeps = trim.stage === 'beep-1' || trim.stage === 'beep-2';
  const heard = trim.stage === 'beep-2' ? 1 : 0;
  return (
    <>
      <Panes left={<RailsPane showsTarget={beeps} inside={trimInside(trim)} fixed={heldReading(trim)} />}>
        <FindingBand finding={finding} trim={trim} />
        {direction && turns !== null && words ? (
          <div className="flex min-h-0 flex-1 items-center justify-between gap-8 px-11 py-6 max-[900px]:flex-col">
            <div className="flex h-full flex-col justify-between gap-4 py-5">
              <div className="text-accent">
                <Fitted as="h1" text={t(`trim.directions.${direction}`)} most={112} width={660} />
                {beeps && <Fitted as="h2" text={t('trim.untilBeep')} most={90} width={660} className="mt-3" />}
              </div>
              <AboutTurns words={words} />
              {beeps && <BeepLine heard={heard} />}
            </div>
            <div className="min-h-0 w-125 max-w-full flex-none">
              <TrimDial direction={direction} turns={turns} />
            </div>
          </div>
        ) : (
          <p className="px-13 py-10 text-b-next font-bold">{t(`findings.${finding}.move`)}</p>
        )}
      </Panes>
      <BenchFooter actions={<TrimActions endTest={beeps} />} />
    </>
  );
}

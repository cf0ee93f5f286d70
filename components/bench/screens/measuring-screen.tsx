import { useTranslations } from 'next-intl';
import type { RunView } from '@/lib/contracts/bench-view';
import { BenchFooter } from '../bench-footer';
import { LiveVolts } from '../live-volts';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { StopButton } from '../stop-button';
import { useSay } from '../use-say';
import { PlainScreen } from './plain-screen';
import { ProgressTicks } from '../progress-ticks';

type MeasuringView = Extract<RunView['screen'], { kind: 'measuring' }>;

/** The station works; hands off. */
export function MeasuringScreen({ screen }: { screen: MeasuringView }) {
  const t = useTranslations('bench.measuring');
  const say = useSay();
  const secondsLeft = secondsLeftOf(screen);
  return (
    <>
      <Panes left={<RailsPane />}>
        <PlainScreen title={say(screen.what)} move={false}>
          <p className="text-ink-2">{t('handsOff')}</p>
          <div className="mt-10 max-w-225">
            <ProgressTicks done={screen.done} of={screen.of} />
            <p className="mt-2 text-b-line text-ink-2">
              {screen.of === null
                ? t('readings', { done: screen.done })
                : t('readingsOf', { done: screen.done, of: screen.of })}
              {secondsLeft !== null &&
                `, ${t(secondsLeft < 90 ? 'secondsLeft' : 'minutesLeft', { left: Math.ceil(secondsLeft < 90 ? secondsLeft : secondsLeft / 60) })}`}
            </p>
          </div>
          <LiveVolts />
        </PlainScreen>
      </Panes>
      <BenchFooter actions={<StopButton />} />
    </>
  );
}

/** Of readings on a fixed beat; null where the beat or the count is not known. */
function secondsLeftOf({ done, of, everyMs }: MeasuringView): number | null {
  return of === null || everyMs === undefined ? null : ((of - done) * everyMs) / 1000;
}

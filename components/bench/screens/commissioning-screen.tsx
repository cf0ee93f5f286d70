import { useTranslations } from 'next-intl';
import type { BenchView } from '@/lib/contracts/bench-view';
import type { CommissioningValues } from '@/lib/run/types';
import { Button } from '../../ui/button';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { FixturePicture } from '../fixture-picture';
import { Panes } from '../panes';
import { ProgressTicks } from '../progress-ticks';
import { StationPanel } from '../station-panel';
import { StopButton } from '../stop-button';
import { useSay } from '../use-say';
import { useNumbers } from '../use-numbers';
import { PlainScreen } from './plain-screen';

type CommissioningView = Extract<BenchView['screen'], { kind: 'commissioning' }>;

/** An engineer measures the station's own overshoot, settling and noise with the reference board. */
export function CommissioningScreen({ screen }: { screen: CommissioningView }) {
  const t = useTranslations('bench.commissioning');
  const say = useSay();
  const { send } = useBench();
  const over = screen.state === 'done' || screen.state === 'failed';
  return (
    <>
      <Panes left={<StationPanel />}>
        <PlainScreen
          title={t(`${screen.state}.title`)}
          move={screen.state === 'seat'}
          picture={screen.state === 'seat' ? <FixturePicture lid="closing" board="in" /> : undefined}
        >
          <p>{say(screen.what)}</p>
          {screen.state === 'measuring' && (
            <div className="mt-9 max-w-225">
              <ProgressTicks done={screen.done} of={screen.of} />
              <p className="mt-2 text-b-line text-ink-2">{t('progress', { done: screen.done, of: screen.of })}</p>
            </div>
          )}
          {screen.values && <Values values={screen.values} />}
        </PlainScreen>
      </Panes>
      <BenchFooter
        note={t('note')}
        actions={
          over ? (
            <Button size="bench" kind="filled" onClick={() => send({ kind: 'continue' })}>
              {t('continue')}
            </Button>
          ) : (
            <StopButton />
          )
        }
      />
    </>
  );
}

function Values({ values }: { values: CommissioningValues }) {
  const t = useTranslations('bench.commissioning');
  const { whole, oneDigit } = useNumbers();
  const rows = [
    [t('overshoot'), `${oneDigit(values.overshoot * 100)} %`],
    [t('settling'), `${whole(values.settleMs)} ms`],
    [t('waypoint'), `${whole(values.waypointMs)} ms`],
    [t('noise'), `${oneDigit(values.noiseVolts * 1000)} mV`],
  ];
  return (
    <dl className="mt-9 grid max-w-225 grid-cols-[1fr_auto] text-b-line">
      {rows.map(([name, value]) => (
        <div key={name} className="col-span-2 grid grid-cols-subgrid border-t-2 border-hair py-3">
          <dt className="text-ink-2">{name}</dt>
          <dd className="font-num font-bold">{value}</dd>
        </div>
      ))}
    </dl>
  );
}

import { useTranslations } from 'next-intl';
import type { RunView, SupplyView } from '@/lib/contracts/bench-view';
import { Button } from '../../ui/button';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { Cautions } from '../cautions';
import { FixturePicture } from '../fixture-picture';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { StopButton } from '../stop-button';
import { SupplyGauge } from '../supply-gauge';
import { Fitted } from '../fitted';

type SealView = Extract<RunView['screen'], { kind: 'seal' }>;

const confirms = {
  'supply-off': null,
  'open-lid': 'lid-open',
  'seal-screw': 'sealed',
  'close-lid': 'lid-closed',
} as const;

/** Supply off and read back below 2 V, lid open, seal the screw, lid closed. Then the board is verified again. */
export function SealScreen({ screen, supply }: { screen: SealView; supply: SupplyView }) {
  const t = useTranslations('bench.seal');
  const { send, view } = useBench();
  const { wants } = screen;
  const what = confirms[wants];
  const byHand = wants === 'seal-screw' || (!view.station.hasController && what !== null);
  return (
    <>
      <Panes left={<RailsPane />}>
        <div className="flex h-full items-center gap-12 px-16 py-8 pr-12 max-[900px]:flex-col max-[900px]:items-start">
          <div className="flex min-w-0 flex-1 flex-col gap-8">
            <Fitted
              as="h1"
              text={t(`${wants}.title`)}
              most={120}
              width={680}
              className={wants === 'supply-off' ? 'text-ink' : 'text-accent'}
            />
            <p className="text-[calc(44*var(--sw-b))] leading-[1.3]">{t(`${wants}.text`)}</p>
            <Cautions which={['supply-off', 'esd', 'site-rules']} />
          </div>
          <div className="grid w-90 flex-none gap-8 max-[900px]:w-full">
            <FixturePicture
              lid={
                wants === 'open-lid'
                  ? 'opening'
                  : wants === 'close-lid'
                    ? 'closing'
                    : wants === 'supply-off'
                      ? 'closed'
                      : 'open'
              }
              board="in"
              seal={wants === 'seal-screw'}
            />
            <SupplyGauge supply={supply} />
          </div>
        </div>
      </Panes>
      <BenchFooter
        actions={
          <>
            <StopButton />
            {byHand && what && (
              <Button size="bench" kind="filled" onClick={() => send({ kind: 'confirm', what })}>
                {t(`${wants}.done`)}
              </Button>
            )}
          </>
        }
      />
    </>
  );
}

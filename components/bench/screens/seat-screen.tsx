import { useTranslations } from 'next-intl';
import type { RunView } from '@/lib/contracts/bench-view';
import { Button } from '../../ui/button';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { FixturePicture } from '../fixture-picture';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { StopButton } from '../stop-button';
import { PlainScreen } from './plain-screen';

type SeatView = Extract<RunView['screen'], { kind: 'seat' }>;

/** Board on the fixture, lid closed; without a fixture controller the operator confirms both. */
export function SeatScreen({ screen }: { screen: SeatView }) {
  const t = useTranslations('bench.seat');
  const { send } = useBench();
  const { wants } = screen;
  const confirms = wants === 'confirm-lid-and-board';
  const picture =
    wants === 'nothing' ? null : wants === 'place-board' ? (
      <FixturePicture lid="open" board="entering" />
    ) : (
      <FixturePicture lid="closing" board="in" />
    );
  return (
    <>
      <Panes left={<RailsPane />}>
        <PlainScreen title={t(`${wants}.title`)} move={wants !== 'nothing'} picture={picture}>
          <p>{t(`${wants}.text`)}</p>
        </PlainScreen>
      </Panes>
      <BenchFooter
        actions={
          <>
            <StopButton />
            {confirms && (
              <Button size="bench" kind="filled" onClick={() => send({ kind: 'confirm', what: 'lid-and-board' })}>
                {t('confirm')}
              </Button>
            )}
          </>
        }
      />
    </>
  );
}

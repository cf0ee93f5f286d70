import { useTranslations } from 'next-intl';
import { serialGroups } from '@/lib/barcode/serial-groups';
import type { BenchView } from '@/lib/contracts/bench-view';
import { Button } from '../../ui/button';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { FixturePicture } from '../fixture-picture';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { PlainScreen } from './plain-screen';

type EmptyFixtureView = Extract<BenchView['screen'], { kind: 'empty-fixture' }>;

/** The fixture must be seen empty between two boards, so that one board cannot be tested under two numbers. */
export function EmptyFixtureScreen({ screen }: { screen: EmptyFixtureView }) {
  const t = useTranslations('bench.emptyFixture');
  const { view, send } = useBench();
  const { hasController } = view.station;
  return (
    <>
      <Panes left={<RailsPane />}>
        <PlainScreen title={t('title')} picture={<FixturePicture lid="open" board="leaving" />}>
          <p>{t(hasController ? 'seen' : 'confirm')}</p>
          {screen.nextSerial && <p>{t('next', { serial: serialGroups(screen.nextSerial).at(-1)! })}</p>}
        </PlainScreen>
      </Panes>
      <BenchFooter
        actions={
          <>
            <Button size="bench" onClick={() => send({ kind: 'end-shift' })}>
              {t('endShift')}
            </Button>
            {!hasController && (
              <Button size="bench" kind="filled" onClick={() => send({ kind: 'confirm', what: 'fixture-empty' })}>
                {t('isEmpty')}
              </Button>
            )}
          </>
        }
      />
    </>
  );
}

import { useTranslations } from 'next-intl';
import type { TrimView } from '@/lib/trim/types';
import { BenchFooter } from '../bench-footer';
import { LiveVolts } from '../live-volts';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { PlainScreen } from '../screens/plain-screen';
import { TrimActions } from './trim-actions';
import { trimInside } from './trim-inside';

/** Between two moves of the hand the station measures what was reached. */
export function MeasuringTrim({ trim, title }: { trim: TrimView; title: string }) {
  const t = useTranslations('bench.trim');
  return (
    <>
      <Panes left={<RailsPane inside={{ ...trimInside(trim), shiftVolts: null }} />}>
        <PlainScreen title={title} move={trim.stage === 'stop-turning'}>
          <p>{t('letGo')}</p>
          <LiveVolts />
        </PlainScreen>
      </Panes>
      <BenchFooter actions={<TrimActions endTest={trim.stage !== 'stop-turning'} />} />
    </>
  );
}

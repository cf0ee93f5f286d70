import { useTranslations } from 'next-intl';
import type { Say } from '@/lib/contracts/bench-view';
import { BenchFooter } from '../bench-footer';
import { CallButton } from '../call-button';
import { Panes } from '../panes';
import { StationPanel } from '../station-panel';
import { useBench } from '../bench-context';
import { useSay } from '../use-say';
import { PlainScreen } from './plain-screen';

/** The station prepares itself, reaches for an instrument, or waits for its records. */
export function StartingScreen({ what }: { what: Say }) {
  const t = useTranslations('bench.starting');
  const say = useSay();
  const { view } = useBench();
  return (
    <>
      <Panes left={<StationPanel />}>
        <PlainScreen title={t('title')} move={false}>
          <p role="status">{say(what)}</p>
          <p className="mt-4 text-ink-2">{t('wait')}</p>
        </PlainScreen>
      </Panes>
      <BenchFooter note={t('note')} actions={view.operator ? <CallButton /> : null} />
    </>
  );
}

import { useTranslations } from 'next-intl';
import type { BenchView } from '@/lib/contracts/bench-view';
import { Button } from '../../ui/button';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { Fitted } from '../fitted';
import { OfferPanel } from '../offer-panel';
import { Panes } from '../panes';
import { BarsPicture, ScanFrame } from '../scan-frame';
import { StationPanel } from '../station-panel';

type ChooseLotView = Extract<BenchView['screen'], { kind: 'choose-lot' }>;

/** The lot sheet is scanned, or an open lot is touched. */
export function ChooseLotScreen({ screen }: { screen: ChooseLotView }) {
  const t = useTranslations('bench.chooseLot');
  const { send, leads, view } = useBench();
  return (
    <>
      <Panes left={<StationPanel />}>
        <div className="flex h-full min-h-0 flex-col gap-7 px-16 pt-10 pb-6 pr-12">
          <Fitted as="h1" text={t('title')} most={120} width={1140} className="text-accent" />
          {view.offer ? (
            <OfferPanel />
          ) : (
            <div className="max-w-200">
              <ScanFrame>
                <BarsPicture x={150} y={24} width={840} height={144} />
              </ScanFrame>
            </div>
          )}
          <p className="text-b-line text-ink-2">{t(screen.lots.length > 0 ? 'orChoose' : 'none')}</p>
          <ul className="flex min-h-0 flex-col gap-(--sw-bench-gap) overflow-y-auto pb-2">
            {screen.lots.map((lot) => (
              <li key={lot.lotId}>
                <button
                  type="button"
                  aria-disabled={!leads}
                  onClick={leads ? () => send({ kind: 'choose-lot', lotId: lot.lotId }) : undefined}
                  className="flex min-h-(--sw-bench-button) w-full items-center justify-between gap-6 border-4 border-accent bg-sheet px-8 text-b-line text-accent hover:bg-accent-wash active:bg-accent active:text-on-accent"
                >
                  <b className="font-num">{lot.code}</b>
                  <span className="text-b-label text-ink-2">
                    {t('lot', { boardType: lot.boardTypeCode, tested: lot.tested, size: lot.size })}
                  </span>
                </button>
              </li>
            ))}
          </ul>
        </div>
      </Panes>
      <BenchFooter
        note={t('note')}
        actions={
          <Button size="bench" onClick={() => send({ kind: 'end-shift' })}>
            {t('endShift')}
          </Button>
        }
      />
    </>
  );
}

import { useTranslations } from 'next-intl';
import { useState, type ReactNode } from 'react';
import { serialGroups } from '@/lib/barcode/serial-groups';
import type { BenchView } from '@/lib/contracts/bench-view';
import { Button } from '../../ui/button';
import { VerdictMark } from '../../ui/verdict-mark';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { SerialByHandDialog } from '../dialogs/serial-by-hand-dialog';
import { Fitted } from '../fitted';
import { LabelNote } from '../label-note';
import { OfferPanel } from '../offer-panel';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { BarsPicture, ScanFrame } from '../scan-frame';
import { TrialActions } from '../trial-actions';
import { useNumbers } from '../use-numbers';

type IdleView = Extract<BenchView['screen'], { kind: 'idle' }>;
const shapes = { pass: 'pass', reject: 'reject', 'no-verdict': 'check' } as const;

/** Waiting for the next board. */
export function IdleScreen({ screen }: { screen: IdleView }) {
  const t = useTranslations('bench.idle');
  const { view, send } = useBench();
  const { whole } = useNumbers();
  const [byHand, setByHand] = useState(false);
  const bold = (chunks: ReactNode) => <b className="font-num text-ink">{chunks}</b>;
  const { last } = screen;
  return (
    <>
      <Panes left={<RailsPane inside={{ boardAbsent: true }} />}>
        <div className="flex h-full flex-col justify-between gap-5 px-16 pt-13 pb-9 pr-12">
          <Fitted as="h1" text={t('title')} most={182} width={1140} className="text-accent" />
          {!view.offer && (
            <ScanFrame>
              <BarsPicture x={148} y={16} width={846} height={160} />
            </ScanFrame>
          )}
          <div className="text-[calc(44*var(--sw-b))] leading-[1.3]">
            {view.lot && <p>{t.rich('anyBoard', { lot: view.lot.code, b: bold })}</p>}
            {view.engineering && <p>{t.rich('anyOfType', { boardType: view.engineering.boardTypeCode, b: bold })}</p>}
            <p>{t(view.station.hasController ? 'closeLid' : 'confirmLid')}</p>
          </div>
          <div className="min-h-12 text-b-line text-ink-2">
            {view.engineering?.note && <p className="mb-4 leading-snug">{view.engineering.note}</p>}
            {last && (
              <p className="flex items-center gap-6">
                <VerdictMark shape={shapes[last.verdict]} size="calc(44 * var(--sw-b))" />
                <span>
                  {t.rich(`last.${last.verdict}`, {
                    serial: serialGroups(last.serial).at(-1)!,
                    seconds: whole(last.seconds),
                    b: bold,
                  })}
                </span>
              </p>
            )}
            <LabelNote onlyProblems />
          </div>
          <OfferPanel />
        </div>
      </Panes>
      <BenchFooter
        actions={
          <>
            <Button size="bench" onClick={() => setByHand(true)}>
              {t('byHand')}
            </Button>
            {view.engineering ? (
              <TrialActions />
            ) : (
              <Button size="bench" onClick={() => send({ kind: 'end-shift' })}>
                {t('endShift')}
              </Button>
            )}
          </>
        }
      />
      <SerialByHandDialog open={byHand} onOpenChange={setByHand} />
    </>
  );
}

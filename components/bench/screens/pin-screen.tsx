import { useTranslations } from 'next-intl';
import type { ReactNode } from 'react';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { Fitted } from '../fitted';
import { Panes } from '../panes';
import { PinPad } from '../pin/pin-pad';
import { usePin } from '../pin/use-pin';
import { Button } from '../../ui/button';
import { VerdictMark } from '../../ui/verdict-mark';
import { StationPanel } from '../station-panel';
import { useSay } from '../use-say';
import { useNumbers } from '../use-numbers';
import type { BenchView } from '@/lib/contracts/bench-view';

type PinView = Extract<BenchView['screen'], { kind: 'pin' }>;

/** The PIN of the badge that was read: by touch or by keys, always in the same places. */
export function PinScreen({ screen }: { screen: PinView }) {
  const t = useTranslations('bench.pin');
  const say = useSay();
  const { clock } = useNumbers();
  const { send, view } = useBench();
  const pin = usePin((digits) => send({ kind: 'pin', digits }), view.revision);
  const bold = (chunks: ReactNode) => <b className="font-num">{chunks}</b>;
  return (
    <>
      <Panes left={<StationPanel />}>
        <div className="flex h-full items-stretch justify-between gap-8 px-16 py-8 pr-12 max-[900px]:flex-col">
          <div className="flex flex-col justify-between gap-4 py-6">
            <div className="text-[calc(44*var(--sw-b))] leading-[1.28]">
              <p>{t.rich('operator', { number: screen.operatorNumber, b: bold })}</p>
              <p>{t.rich('read', { time: clock(screen.badgeReadIso), b: bold })}</p>
            </div>
            <Fitted as="h1" text={t('title')} most={118} width={520} className="text-accent" />
            <PinCombs typed={pin.digits.length} fewest={pin.fewest} />
            <div aria-live="polite" className="min-h-11 text-b-line text-ink-2">
              {screen.problem ? (
                <p className="flex items-center gap-3 font-bold text-reject" role="alert">
                  <VerdictMark shape="reject" size="0.9em" />
                  {say(screen.problem)}
                </p>
              ) : (
                <p>{t('typed', { count: pin.digits.length, fewest: pin.fewest })}</p>
              )}
            </div>
          </div>
          <PinPad pin={pin} retryAtIso={screen.retryAtIso} />
        </div>
      </Panes>
      <BenchFooter
        note={t('note')}
        actions={
          <Button size="bench" onClick={() => send({ kind: 'another-badge' })}>
            {t('anotherBadge')}
          </Button>
        }
      />
    </>
  );
}

/** Digits as squares on combs; the next one is blue. */
function PinCombs({ typed, fewest }: { typed: number; fewest: number }) {
  const t = useTranslations('bench.pin');
  return (
    <div className="flex gap-5" role="img" aria-label={t('typed', { count: typed, fewest })}>
      {Array.from({ length: Math.max(fewest, Math.min(8, typed + (typed >= fewest ? 0 : 1))) }, (_, i) => (
        <span key={i} className="flex flex-col items-center gap-5">
          <span className={`size-11 ${i < typed ? 'bg-ink' : ''}`} />
          <span className={`h-3 w-21 ${i < typed ? 'bg-ink' : i === typed ? 'bg-accent' : 'bg-rule'}`} />
        </span>
      ))}
    </div>
  );
}

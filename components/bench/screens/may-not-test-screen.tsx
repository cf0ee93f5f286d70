import { useTranslations } from 'next-intl';
import type { ReactNode } from 'react';
import type { BenchView } from '@/lib/contracts/bench-view';
import { Button } from '../../ui/button';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { CallButton } from '../call-button';
import { Fitted } from '../fitted';
import { Panes } from '../panes';
import { StationPanel } from '../station-panel';
import { useSay } from '../use-say';

type MayNotTestView = Extract<BenchView['screen'], { kind: 'may-not-test' }>;

/** Why this station may not test, and what to do about it. */
export function MayNotTestScreen({ screen }: { screen: MayNotTestView }) {
  const t = useTranslations('bench.mayNotTest');
  const trial = useTranslations('bench.engineering');
  const say = useSay();
  const { view, send } = useBench();
  const first = screen.reasons[0];
  const lot = view.lot?.code;
  return (
    <>
      <Panes left={<StationPanel />}>
        <div className="flex flex-none items-stretch bg-attn text-on-attn">
          <div className="w-14 flex-none bg-[repeating-linear-gradient(-45deg,var(--sw-on-attn)_0_calc(16*var(--sw-b)),var(--sw-attn)_calc(16*var(--sw-b))_calc(40*var(--sw-b)))]" />
          <div className="px-9 pt-6 pb-5">
            <Fitted as="h1" text={t('title')} most={110} width={1100} className="!font-extrabold" />
            <ul className="mt-4 text-b-line leading-snug font-bold">
              {screen.reasons.map((reason) => (
                <li key={reason.faultCode + reason.code}>
                  {say(reason)} <span className="font-num">{reason.faultCode}</span>
                </li>
              ))}
            </ul>
          </div>
        </div>
        <ol className="px-14 py-3">
          <Advice number={1} title={t('call')} text={first ? t('tell', { code: first.faultCode }) : ''} />
          {screen.otherStation && (
            <Advice
              number={2}
              title={
                lot ? t('takeLot', { lot, station: screen.otherStation }) : t('use', { station: screen.otherStation })
              }
              text={t('otherIsFree', { station: screen.otherStation })}
            />
          )}
          <Advice number={screen.otherStation ? 3 : 2} title={t('leave')} text={t('recorded')} />
        </ol>
      </Panes>
      <BenchFooter
        note={t('note')}
        actions={
          <>
            {view.engineering ? (
              <Button size="bench" onClick={() => send({ kind: 'leave-trial' })}>
                {trial('leave')}
              </Button>
            ) : (
              <Button size="bench" onClick={() => send({ kind: 'end-shift' })}>
                {t('signOut')}
              </Button>
            )}
            <CallButton kind="filled" />
          </>
        }
      />
    </>
  );
}

function Advice({ number, title, text }: { number: number; title: ReactNode; text: ReactNode }) {
  return (
    <li className="flex gap-10 border-b-2 border-hair py-3.5 last:border-0">
      <span className="text-[calc(44*var(--sw-b))] leading-tight font-bold">{number}</span>
      <div>
        <h2 className="text-[calc(42*var(--sw-b))] leading-tight font-bold">{title}</h2>
        <p className="text-b-line leading-snug text-ink-2">{text}</p>
      </div>
    </li>
  );
}

import { useTranslations } from 'next-intl';
import type { ReactNode } from 'react';
import { serialGroups } from '@/lib/barcode/serial-groups';
import type { RunView } from '@/lib/contracts/bench-view';
import { Button } from '../../ui/button';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { CallButton } from '../call-button';
import { Cautions } from '../cautions';
import { BandTriangle } from '../finding-band';
import { Fitted } from '../fitted';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { SupplyGauge } from '../supply-gauge';
import { useSay } from '../use-say';

type NoVerdictView = Extract<RunView['screen'], { kind: 'no-verdict' }>;

/** The run ended for a reason that is not the board's. "Supply is off" is said only after read-back below 2 V. */
export function NoVerdictScreen({ screen, run }: { screen: NoVerdictView; run: RunView }) {
  const t = useTranslations('bench.noVerdict');
  const words = useTranslations('noVerdict');
  const say = useSay();
  const { send, view } = useBench();
  // A trial makes no board wait for quality.
  const failing = screen.failingWhenStopped && !view.engineering;
  const { supply } = run;
  const off = supply.state === 'off' && supply.volts < 2;
  const stopped = screen.reason === 'operator-stop';
  const serial = serialGroups(run.serial).at(-1)!;
  const bold = (chunks: ReactNode) => <b className="font-num text-ink">{chunks}</b>;
  return (
    <>
      <Panes
        left={
          <RailsPane
            inside={{ stoppedAtVolts: screen.stoppedAtVolts }}
            fixed={
              screen.stoppedAtVolts === null ? null : { volts: screen.stoppedAtVolts, output: null, rail: 'falling' }
            }
          />
        }
      >
        <div className="flex min-h-75 flex-none items-center gap-12 bg-attn px-15 py-8 text-on-attn">
          <BandTriangle size={202} />
          <div className="min-w-0">
            <Fitted
              as="h1"
              text={words(`${screen.reason}.title`)}
              most={140}
              width={860}
              narrow={520}
              className="!font-extrabold"
            />
            <p className="mt-4 text-[calc(40*var(--sw-b))] leading-tight font-bold">
              {screen.detail ? say(screen.detail) : words(`${screen.reason}.text`)}{' '}
              {screen.code && <span className="font-num">{screen.code}</span>}
            </p>
          </div>
        </div>
        <div className="flex min-h-0 flex-1 justify-between gap-9 px-14 py-5 pr-10 max-[900px]:flex-col">
          <div className="flex min-w-0 flex-1 flex-col gap-4.5">
            <div role="alert">
              {off ? (
                <Fitted text={t('supplyOff')} most={62} width={740} className="!leading-[1.14]" />
              ) : (
                <p className="text-[calc(52*var(--sw-b))] leading-[1.14] font-bold">{t('supplyMaybeOn')}</p>
              )}
            </div>
            <p className="text-b-line leading-[1.3] text-ink-2">
              {t.rich('notJudged', { serial, b: bold })} {off && words(`${screen.reason}.next`)}
              {failing && <b className="block text-ink">{t('failing')}</b>}
            </p>
            {!stopped && !failing && <p className="text-b-line leading-[1.3] text-ink-2">{t('again')}</p>}
          </div>
          <div className="w-108 flex-none max-[900px]:w-full">
            <SupplyGauge supply={supply} />
            <Cautions which={['supply-off', 'eyes', 'site-rules']} className="mt-3" />
          </div>
        </div>
      </Panes>
      <BenchFooter
        actions={
          <>
            <CallButton />
            <Button size="bench" kind="filled" onClick={() => send({ kind: 'try-again' })}>
              {t('tryAgain')}
            </Button>
          </>
        }
      />
    </>
  );
}

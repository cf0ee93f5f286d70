import { useTranslations } from 'next-intl';
import type { ReactNode } from 'react';
import type { RunView } from '@/lib/contracts/bench-view';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { BinPicture } from '../bin-picture';
import { CallButton } from '../call-button';
import { Fitted } from '../fitted';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { TrialActions } from '../trial-actions';
import { useQuantity } from '../use-quantity';

type RejectView = Extract<RunView['screen'], { kind: 'reject' }>;

/** Reject floods the pane. A new scan is locked until the bin is scanned; `binCode` is null until the run is recorded. */
export function RejectScreen({ screen, binCode }: { screen: RejectView; binCode: string | null }) {
  const t = useTranslations('bench.reject');
  const words = useTranslations();
  const { engineering } = useBench().view;
  const { measured, reason, cause } = screen;
  return (
    <>
      <Panes left={<RailsPane />}>
        <div className="flex h-full min-h-0 flex-1 flex-col gap-6 bg-reject-flood px-14 pt-11 pb-8 text-on-flood">
          <div className="flex items-center gap-15">
            <svg viewBox="0 0 200 200" aria-hidden="true" className="w-50 flex-none max-[900px]:w-30">
              <rect width={200} height={200} fill="var(--sw-on-flood)" />
              <path d="M44 44l112 112M156 44 44 156" stroke="var(--sw-reject-flood)" strokeWidth={34} />
            </svg>
            <Fitted as="h1" text={t('title')} most={224} width={860} narrow={590} className="!font-extrabold" />
          </div>
          <div className="flex min-h-0 flex-1 gap-12 max-[900px]:flex-col">
            <div className="flex min-w-0 flex-1 flex-col">
              <h2 className="text-[calc(54*var(--sw-b))] leading-tight font-bold">{words(`reject.${reason}`)}</h2>
              <p className="mt-2 text-[calc(42*var(--sw-b))] leading-[1.34]">
                {measured && <Measured measured={measured} />}{' '}
                {cause && t('likely', { cause: words(`cause.${cause}`) })}
              </p>
              <ol className="mt-6 grid gap-4 border-t-4 border-on-flood pt-7 text-[calc(48*var(--sw-b))] leading-tight font-bold">
                <li className="flex gap-9">
                  {!engineering && <span>1</span>}
                  <Fitted
                    text={t(engineering ? 'keepApart' : 'putInBin')}
                    most={48}
                    width={660}
                    as="span"
                    className="!leading-tight"
                  />
                </li>
                {binCode !== null && (
                  <li className="flex gap-9">
                    <span>2</span>
                    <Fitted
                      text={t('scanBin', { bin: binCode })}
                      most={48}
                      width={660}
                      as="span"
                      className="!leading-tight"
                    />
                  </li>
                )}
              </ol>
            </div>
            {binCode !== null && <BinPicture code={binCode} label={t('bin', { bin: binCode })} />}
          </div>
        </div>
      </Panes>
      <BenchFooter
        ending={binCode === null ? t('recording') : t('waitingForBin')}
        actions={
          <>
            <CallButton />
            {engineering && <TrialActions />}
          </>
        }
      />
    </>
  );
}

/** The measured value and the limit it missed. */
function Measured({ measured }: { measured: NonNullable<RejectView['measured']> }) {
  const t = useTranslations('bench.reject');
  const quantity = useQuantity();
  const mono = (chunks: ReactNode) => <b className="font-num">{chunks}</b>;
  const { value, unit, limit } = measured;
  const found = quantity(value, unit, limit ?? undefined);
  if (limit === null) return t.rich('measured', { value: found.number, unit: found.unit, b: mono });
  return t.rich('measuredLimit', {
    value: found.number,
    unit: found.unit,
    limit: quantity(limit, unit, value).number,
    b: mono,
  });
}

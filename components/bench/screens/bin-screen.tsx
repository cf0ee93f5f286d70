import { useTranslations } from 'next-intl';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { BinPicture } from '../bin-picture';
import { CallButton } from '../call-button';
import { Fitted } from '../fitted';
import { RunScreen } from '../run-screen';

/** A reject waits for its bin. After a restart the run itself may be gone from the screen; the bin scan is still owed. */
export function BinScreen({ binCode }: { binCode: string }) {
  const t = useTranslations('bench.reject');
  const { run } = useBench().view;
  if (run?.screen.kind === 'reject') return <RunScreen run={run} binCode={binCode} />;
  return (
    <>
      <div className="flex min-h-0 flex-1 items-center justify-between gap-16 bg-reject-flood px-16 py-10 text-on-flood">
        <div>
          <Fitted as="h1" text={t('title')} most={224} width={1200} className="!font-extrabold" />
          <p className="mt-12 text-b-next font-bold">{t('putInBin')}</p>
          <p className="text-b-next font-bold">{t('scanBin', { bin: binCode })}</p>
        </div>
        <BinPicture code={binCode} label={t('bin', { bin: binCode })} />
      </div>
      <BenchFooter ending={t('waitingForBin')} actions={<CallButton />} />
    </>
  );
}

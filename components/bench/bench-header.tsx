import { useTranslations } from 'next-intl';
import type { ReactNode } from 'react';
import { Mark } from '../ui/mark';
import { SerialStrip } from '../ui/serial-strip';
import { useBench } from './bench-context';

/** Empty combs: where the next serial number will stand. */
function Combs({ label }: { label: string }) {
  return (
    <span className="flex gap-6" role="img" aria-label={label}>
      {[6, 4, 5].map((teeth, group) => (
        <span key={group} className="flex gap-1">
          {Array.from({ length: teeth }, (_, i) => (
            <span key={i} className={`bg-rule ${group === 2 ? 'h-[0.11em] w-[0.8em]' : 'h-[0.08em] w-[0.62em]'}`} />
          ))}
        </span>
      ))}
    </span>
  );
}

/** Mark, serial number, station, lot and operator; closer together under the band of a trial. `tools` stand at the right over the step line. */
export function BenchHeader({ tools }: { tools?: ReactNode }) {
  const t = useTranslations('bench.header');
  const { view } = useBench();
  const { station, lot, operator, run, screen, engineering } = view;
  const signedIn = operator !== null && screen.kind !== 'may-not-test';
  const bold = (chunks: ReactNode) => <b className="text-ink">{chunks}</b>;
  const mono = (chunks: ReactNode) => <b className="font-num text-ink">{chunks}</b>;
  return (
    <header
      className={`relative flex items-start justify-between gap-8 px-12 max-[900px]:flex-wrap max-[900px]:gap-3 ${engineering ? 'pt-4 min-[900px]:h-26' : 'pt-9 min-[900px]:h-36.5'}`}
    >
      <div className="flex min-h-18 items-center gap-9 max-[900px]:gap-5">
        <Mark size="calc(76 * var(--sw-b))" title="Sillwright" />
        {run ? (
          <p className="text-b-serial leading-none max-[900px]:text-[calc(74*var(--sw-b))] [&_.text-ink-2]:text-[0.76em]">
            <SerialStrip serial={run.serial} boardTypeCode={(engineering ?? lot)?.boardTypeCode} />
          </p>
        ) : signedIn ? (
          <p className="flex items-end pt-9 text-b-next leading-none">
            <Combs label={t('noSerial')} />
          </p>
        ) : (
          <p className="text-b-next font-bold leading-none">Sillwright</p>
        )}
      </div>
      <div className="flex flex-none flex-col items-end text-end text-b-label leading-[1.28] text-ink-2 max-[900px]:items-start max-[900px]:text-start">
        <p>{t.rich('station', { name: station.name, fixture: station.fixture, b: bold })}</p>
        <p>
          {lot && t.rich('lot', { lot: lot.code, b: mono })}
          {engineering && t.rich('trial', { revision: engineering.revision, b: mono })}
          {(engineering || lot) && operator && ', '}
          {operator && t.rich('operator', { number: operator.number, b: mono })}
          {!operator && t('nobody')}
        </p>
      </div>
      {tools}
    </header>
  );
}

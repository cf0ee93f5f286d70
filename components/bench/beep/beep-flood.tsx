import { useTranslations } from 'next-intl';
import { Button } from '../../ui/button';
import { Mark } from '../../ui/mark';
import { SerialStrip } from '../../ui/serial-strip';
import { useBench } from '../bench-context';
import { EngineeringBand } from '../engineering-band';
import { Fitted } from '../fitted';
import type { Beep } from './flood-machine';
import { FloodProgress } from './flood-progress';

/** The whole screen turns blue: the board answered, so let the screw go. One change in, one out; no fade, blink or loop. */
export function BeepFlood({ beep }: { beep: Beep }) {
  const t = useTranslations('bench.flood');
  const { view, leads, send } = useBench();
  return (
    <div
      role="alert"
      data-flood={beep}
      className="absolute inset-0 z-20 flex flex-col bg-accent text-on-accent [&_.text-ink-2]:text-on-accent"
    >
      <EngineeringBand />
      <div className="flex min-h-27 items-center gap-9 max-[900px]:gap-5 px-12 pt-9">
        <Mark size="calc(76 * var(--sw-b))" />
        {view.run && (
          <p className="text-b-serial leading-none max-[900px]:text-[calc(74*var(--sw-b))] [&_.text-ink-2]:text-[0.76em]">
            <SerialStrip serial={view.run.serial} boardTypeCode={(view.engineering ?? view.lot)?.boardTypeCode} />
          </p>
        )}
        <p className="ml-auto text-end max-[900px]:hidden text-b-label leading-[1.28]">
          <b>{view.station.name}</b>, {view.station.fixture}
          <br />
          {view.lot && <b className="font-num">{view.lot.code}</b>}
        </p>
      </div>
      <div className="flex min-h-0 flex-1 items-center gap-21 px-14 max-[900px]:flex-col max-[900px]:justify-center max-[900px]:gap-10">
        <ClosedJaws />
        <div className="min-w-0">
          <Fitted as="h2" text={t('stop')} most={500} width={1200} className="!leading-[0.85] !font-extrabold" />
          <p className="mt-16 text-[calc(84*var(--sw-b))] leading-[1.12] font-bold whitespace-pre-line">
            {t(beep === 1 ? 'first' : 'second')}
          </p>
        </div>
      </div>
      <div className="flex items-center justify-between gap-12 border-t-4 border-on-accent px-12 py-5.5">
        <div className="w-295 text-b-line">
          <p>{t('measuring')}</p>
          <FloodProgress />
        </div>
        {leads && (
          <Button
            size="bench"
            kind="stop"
            className="!border-on-accent !bg-on-accent !text-accent"
            onClick={() => send({ kind: 'stop' })}
          >
            {t('endTest')}
          </Button>
        )}
      </div>
    </div>
  );
}

/** Gauge jaws closed on a screw. */
function ClosedJaws() {
  return (
    <svg viewBox="0 0 540 502" aria-hidden="true" className="h-auto w-135 flex-none max-[900px]:w-90">
      <g fill="currentColor">
        <path d="M0 0H81L160 125V376L81 501H0ZM540 0H459L380 125V376L459 501H540Z" />
        <path d="M270 146a104 104 0 1 0 0 209 104 104 0 1 0 0-209ZM255 164h30v173h-30Z" fillRule="evenodd" />
      </g>
    </svg>
  );
}

import { useTranslations } from 'next-intl';
import { useRef } from 'react';
import { useBench } from './bench-context';
import { useDisplayRate } from './live/use-display-rate';
import { useNumbers } from './use-numbers';

/** The supply at the board and the state of its output, as read. Repainted at display rate without React. */
export function LiveVolts() {
  const t = useTranslations('bench.live');
  const { readings, lost } = useBench();
  const { volts } = useNumbers();
  const number = useRef<HTMLSpanElement>(null);
  const state = useRef<HTMLSpanElement>(null);
  const words = { on: t('on'), off: t('off') };
  useDisplayRate(readings, (reading) => {
    if (number.current) number.current.textContent = reading ? volts(reading.volts) : '–';
    if (state.current) state.current.textContent = reading?.output ? words[reading.output] : '';
  });
  return (
    <p className={`mt-8 flex items-baseline gap-5 text-b-line text-ink-2 ${lost ? 'opacity-40' : ''}`}>
      {t('supply')}
      <span className="text-ink">
        <span ref={number} className="font-num text-b-next font-bold">
          –
        </span>{' '}
        V
      </span>
      <span ref={state} className="font-bold" />
    </p>
  );
}

import { useTranslations } from 'next-intl';
import { useEffect, useState } from 'react';
import { useNumbers } from '../use-numbers';
import type { Pin } from './use-pin';

const keys = ['1', '2', '3', '4', '5', '6', '7', '8', '9'] as const;
const size = 'min-h-37 w-46 max-[900px]:w-full max-[900px]:min-h-16';
const rest =
  'border-4 border-accent bg-sheet font-bold text-accent active:bg-accent active:text-on-accent data-pressed:bg-accent data-pressed:text-on-accent';

/** Keys in fixed order, 184 × 148, 24 apart. "Sign in" is dashed until the last digit. */
export function PinPad({ pin, retryAtIso }: { pin: Pin; retryAtIso: string | null }) {
  const t = useTranslations('bench.pin');
  const waiting = useWaiting(retryAtIso);
  const { clock } = useNumbers();
  const ready = pin.complete && !waiting;
  return (
    <div className="grid flex-none grid-cols-3 content-start gap-(--sw-bench-gap)" role="group" aria-label={t('keys')}>
      {keys.map((key) => (
        <DigitKey key={key} digit={key} onPress={pin.press} />
      ))}
      <button type="button" className={`${size} ${rest} text-b-line`} onClick={pin.erase}>
        {t('erase')}
      </button>
      <DigitKey digit="0" onPress={pin.press} />
      <button
        type="button"
        aria-disabled={!ready}
        data-filled={ready ? '' : undefined}
        onClick={ready ? pin.submit : undefined}
        className={`${size} text-b-line leading-tight font-bold ${ready ? 'border-4 border-accent bg-accent text-on-accent hover:bg-accent-deep' : 'border-4 border-dashed border-rule text-ink-3'}`}
      >
        {waiting && retryAtIso
          ? t('signInAt', { time: clock(retryAtIso) })
          : pin.complete
            ? t('signIn')
            : t('signInAfter', { fewest: pin.fewest })}
      </button>
    </div>
  );
}

/** Shows itself pressed for 120 ms, so that a gloved finger sees that it counted. */
function DigitKey({ digit, onPress }: { digit: string; onPress: (digit: string) => void }) {
  const [pressed, setPressed] = useState(false);
  useEffect(() => {
    if (!pressed) return;
    const timer = setTimeout(() => setPressed(false), 120);
    return () => clearTimeout(timer);
  }, [pressed]);
  return (
    <button
      type="button"
      data-pressed={pressed ? '' : undefined}
      className={`${size} ${rest} text-[calc(76*var(--sw-b))]`}
      onClick={() => {
        setPressed(true);
        onPress(digit);
      }}
    >
      {digit}
    </button>
  );
}

/** Whether `untilIso` still lies ahead; turns false by itself. */
function useWaiting(untilIso: string | null): boolean {
  const [now, setNow] = useState(() => Date.now());
  const until = untilIso === null ? 0 : Date.parse(untilIso);
  useEffect(() => {
    if (until <= Date.now()) return;
    const timer = setTimeout(() => setNow(Date.now()), until - Date.now() + 50);
    return () => clearTimeout(timer);
  }, [until]);
  return until > now;
}

import { useLocale } from 'next-intl';
import { useMemo } from 'react';

/** Numbers and times as the operator's language writes them. */
export function useNumbers() {
  const language = useLocale();
  return useMemo(() => {
    const locale = language === 'en' ? 'en-GB' : language;
    const fixed = (digits: number) =>
      new Intl.NumberFormat(locale, {
        minimumFractionDigits: digits,
        maximumFractionDigits: digits,
        useGrouping: false,
      });
    const [whole, one, two, three] = [fixed(0), fixed(1), fixed(2), fixed(3)] as const;
    const clock = new Intl.DateTimeFormat(locale, { hour: '2-digit', minute: '2-digit', hour12: false });
    const day = new Intl.DateTimeFormat(locale, { day: 'numeric', month: 'long' });
    const dayOf = (date: Date) => date.toDateString();
    return {
      /** Two digits after the point, as on every scale. */
      volts: (value: number) => two.format(value),
      /** With its sign, also for zero and above; a true minus sign. */
      signedVolts: (value: number) => (value < 0 ? '−' : '+') + two.format(Math.abs(value)),
      whole: (value: number) => whole.format(value),
      oneDigit: (value: number) => one.format(value),
      threeDigits: (value: number) => three.format(value),
      clock: (iso: string) => clock.format(new Date(iso)),
      day: (iso: string) => day.format(new Date(iso)),
      /** The time alone when it is today, else day and month. */
      when: (iso: string, now = new Date()) =>
        dayOf(new Date(iso)) === dayOf(now) ? clock.format(new Date(iso)) : day.format(new Date(iso)),
      isToday: (iso: string, now = new Date()) => dayOf(new Date(iso)) === dayOf(now),
    };
  }, [language]);
}

'use client';

import { useSyncExternalStore } from 'react';

const never = () => () => {};

/** The browser's time zone; UTC while the page comes from the server, so that both draw the same. */
export function useTimeZone(): string {
  return useSyncExternalStore(
    never,
    () => Intl.DateTimeFormat().resolvedOptions().timeZone,
    () => 'UTC',
  );
}

const formats = {
  /** 25 Nov 2026 11:38:03 */
  second: { day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit', second: '2-digit' },
  /** 25 Nov 2026 11:38 */
  minute: { day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit' },
  /** 25 Nov 2026 */
  day: { day: 'numeric', month: 'short', year: 'numeric' },
  /** 11:38:03 */
  clock: { hour: '2-digit', minute: '2-digit', second: '2-digit' },
  /** 11:38 */
  'short-clock': { hour: '2-digit', minute: '2-digit' },
} as const satisfies Record<string, Intl.DateTimeFormatOptions>;
export type TimeFormat = keyof typeof formats;

export function formatTime(iso: string, format: TimeFormat, timeZone: string): string {
  return new Intl.DateTimeFormat('en-GB', { ...formats[format], timeZone, hour12: false })
    .format(new Date(iso))
    .replace(',', '');
}

/** A moment in the reader's own time zone. */
export function Time({ iso, format = 'minute' }: { iso: string; format?: TimeFormat }) {
  const timeZone = useTimeZone();
  return (
    <time dateTime={iso} className="whitespace-nowrap">
      {formatTime(iso, format, timeZone)}
    </time>
  );
}

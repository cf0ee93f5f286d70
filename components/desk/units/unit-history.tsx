'use client';

import type { UnitPage } from '@/lib/contracts/unit-page';
import { formatTime, useTimeZone } from '../time';
import { historyOf } from './history';

/** What happened, newest first; the day is said where it changes. */
export function UnitHistory({ unit }: { unit: UnitPage }) {
  const timeZone = useTimeZone();
  const entries = historyOf(unit);
  if (entries.length === 0) return <p className="text-ink-2">Nothing has happened to this board yet.</p>;
  return (
    <ol>
      {entries.map(({ key, iso, text }, i) => {
        const day = formatTime(iso, 'day', timeZone);
        const newDay = i === 0 || formatTime(entries[i - 1]!.iso, 'day', timeZone) !== day;
        return (
          <li key={key} className="border-b border-hair py-1.5">
            <time dateTime={iso} className="block font-num text-cap text-ink-2">
              {newDay ? `${day} ` : ''}
              {formatTime(iso, 'clock', timeZone)}
            </time>
            {text}
          </li>
        );
      })}
    </ol>
  );
}

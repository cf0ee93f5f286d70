'use client';

import { useEffect, useState } from 'react';
import { Time } from './time';

const staleAfterMs = 10_000;

/** "Last heard 07:31:08" once live data is older than 10 s; nothing before. */
export function StaleNote({ updatedAt, failing }: { updatedAt: number; failing: boolean }) {
  const [now, setNow] = useState(updatedAt);
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), 1_000);
    return () => clearInterval(timer);
  }, []);
  if (!failing || now - updatedAt < staleAfterMs) return null;
  return (
    <p role="status" className="mt-2 border-y border-dashed border-rule py-2">
      The server does not answer. Last heard <Time iso={new Date(updatedAt).toISOString()} format="clock" />. Stations
      keep testing.
    </p>
  );
}

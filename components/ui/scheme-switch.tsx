'use client';

import { useState } from 'react';
import { type Scheme, schemeCookie, showScheme } from './scheme';

const next: Record<Scheme, Scheme> = { system: 'day', day: 'night', night: 'system' };
const words: Record<Scheme, string> = { system: 'Day or night', day: 'Day bench', night: 'Night bench' };

/** Day, night, or as the system says; kept in a cookie for a year. */
export function SchemeSwitch({ initial }: { initial: Scheme }) {
  const [scheme, setScheme] = useState(initial);
  const choose = (chosen: Scheme) => {
    setScheme(chosen);
    showScheme(chosen);
    const age = chosen === 'system' ? 0 : 31_536_000;
    document.cookie = `${schemeCookie}=${chosen}; path=/; max-age=${age}; samesite=lax`;
  };
  return (
    <button
      type="button"
      className="min-h-9 text-cap text-ink-2 hover:text-accent max-sm:min-h-[46px]"
      aria-label={`${words[scheme]}. Change to ${words[next[scheme]].toLowerCase()}.`}
      onClick={() => choose(next[scheme])}
    >
      {words[scheme]}
    </button>
  );
}

'use client';

import { signOut } from 'next-auth/react';
import { useEffect } from 'react';

/** A session that was ended elsewhere ends its open pages within 5 s. */
const askEveryMs = 3_500;
const lockAfterMs = 15 * 60_000;

function leave(because: 'ended' | 'locked'): void {
  const here = window.location.pathname + window.location.search;
  window.location.replace(`/sign-in?because=${because}&next=${encodeURIComponent(here)}`);
}

/** Leaves the page when its session has ended, and locks it after 15 minutes without a key or touch. Draws nothing. */
export function SessionWatch() {
  useEffect(() => {
    let lastActMs = Date.now();
    const act = () => (lastActMs = Date.now());
    const acts = ['keydown', 'pointerdown', 'wheel', 'touchstart'] as const;
    acts.forEach((name) => window.addEventListener(name, act, { passive: true }));

    let busy = false;
    async function look(): Promise<void> {
      if (busy) return;
      busy = true;
      try {
        if (Date.now() - lastActMs > lockAfterMs) {
          await signOut({ redirect: false });
          return leave('locked');
        }
        const response = await fetch('/api/session', { cache: 'no-store' });
        const { signedIn } = (await response.json()) as { signedIn: boolean };
        if (response.ok && !signedIn) leave('ended');
      } catch {
        // The server or its database is away, which ends nobody's session.
      } finally {
        busy = false;
      }
    }
    const timer = setInterval(() => void look(), askEveryMs);
    const onShown = () => document.visibilityState === 'visible' && void look();
    document.addEventListener('visibilitychange', onShown);
    return () => {
      clearInterval(timer);
      document.removeEventListener('visibilitychange', onShown);
      acts.forEach((name) => window.removeEventListener(name, act));
    };
  }, []);
  return null;
}

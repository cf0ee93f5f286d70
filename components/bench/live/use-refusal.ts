import { useCallback, useEffect, useState } from 'react';
import type { CommandReply } from '@/lib/contracts/bench-command';
import type { BenchView, Say } from '@/lib/contracts/bench-view';

export type ShownRefusal = Say & { serial: string | null };

/** Long enough to read two sentences twice. */
const shownMs = 12_000;

/**
 * The refusal to show: the newest of the view and of the answers to this screen's own commands. It goes after a while, and at
 * once when something was accepted.
 */
export function useRefusal(view: BenchView | null): {
  refusal: ShownRefusal | null;
  take: (reply: CommandReply) => void;
} {
  const [shown, setShown] = useState<ShownRefusal | null>(null);
  const [seenIso, setSeenIso] = useState<string | null>(null);
  const newest = view?.refusal ?? null;
  if (newest && newest.atIso !== seenIso) {
    const { atIso, ...refusal } = newest;
    setSeenIso(atIso);
    setShown(refusal);
  }
  const take = useCallback((reply: CommandReply) => {
    if (reply.ok) setShown(null);
    else
      setShown((before) =>
        before?.code === reply.code ? before : { code: reply.code, params: reply.params, serial: null },
      );
  }, []);
  useEffect(() => {
    if (!shown) return;
    const timer = setTimeout(() => setShown(null), shownMs);
    return () => clearTimeout(timer);
  }, [shown]);
  return { refusal: shown, take };
}

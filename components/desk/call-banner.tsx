'use client';

import { useQuery } from '@tanstack/react-query';
import { usePathname } from 'next/navigation';
import { useEffect, useState } from 'react';
import { Button } from '@/components/ui/button';
import { useToast } from '@/components/ui/toast';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { EngineerCall } from '@/lib/contracts/engineer-call';
import type { Outcome } from '@/lib/contracts/outcome';
import { fetchJson } from './fetch-json';

const askEveryMs = 4_000;

interface CallBannerProps {
  /** Null: this person may not answer calls; the banner only tells. */
  acknowledge: ((input: unknown) => Promise<Outcome>) | null;
}

/** Benches that call an engineer, on every desk page until someone says "I am coming". Timed; it never blinks. */
export function CallBanner({ acknowledge }: CallBannerProps) {
  const toast = useToast();
  const path = usePathname();
  const query = useQuery({
    queryKey: ['calls'],
    queryFn: ({ signal }) => fetchJson<EngineerCall[]>('/api/calls', signal),
    refetchInterval: askEveryMs,
  });
  const [busy, setBusy] = useState<string | null>(null);
  const calls = query.data ?? [];
  // The list of stations shows them itself.
  if (calls.length === 0 || path === '/stations') return null;

  async function come(call: EngineerCall): Promise<void> {
    setBusy(call.id);
    const outcome = await acknowledge?.({ callId: call.id }).catch(() => null);
    if (outcome?.ok) toast(`${call.stationName} knows that you are coming`);
    else toast(outcome?.sentence ?? 'The server did not answer. Try again.');
    await query.refetch();
    setBusy(null);
  }

  return (
    <ul
      role="status"
      aria-label="Calls for an engineer"
      className="sw-screen-only -mx-12 -mt-5 mb-5 border-b-2 border-ink max-sm:-mx-[18px]"
    >
      {calls.map((call) => (
        <li key={call.id} className="sw-hold flex flex-wrap items-center gap-x-5 gap-y-2 !pl-12 max-sm:!pl-8">
          <VerdictMark shape="check" size={22} />
          <span>
            <b>{call.stationName} calls an engineer</b> for <Waiting sinceIso={call.sinceIso} />
            {call.operatorNumber ? `, operator ${call.operatorNumber}` : ''}
            {call.serial ? (
              <>
                , board <span className="font-num">{call.serial.slice(-5)}</span>
              </>
            ) : null}
            .
          </span>
          {acknowledge ? (
            <Button
              kind="filled"
              className="ml-auto"
              pending={busy === call.id ? 'Telling the bench' : null}
              onClick={() => void come(call)}
            >
              I am coming
            </Button>
          ) : null}
        </li>
      ))}
    </ul>
  );
}

/** "40 s", then "6 min". */
export function Waiting({ sinceIso }: { sinceIso: string }) {
  const [now, setNow] = useState<number | null>(null);
  useEffect(() => {
    const tick = () => setNow(Date.now());
    const first = setTimeout(tick, 0);
    const timer = setInterval(tick, 1_000);
    return () => {
      clearTimeout(first);
      clearInterval(timer);
    };
  }, []);
  const seconds = now === null ? 0 : Math.max(0, Math.round((now - Date.parse(sinceIso)) / 1_000));
  return (
    <b>
      {seconds < 90
        ? `${seconds} s`
        : seconds < 5_400
          ? `${Math.round(seconds / 60)} min`
          : `${Math.round(seconds / 3_600)} h`}
    </b>
  );
}

'use client';

import { useState, useTransition } from 'react';
import { Button } from '@/components/ui/button';
import { VerdictMark } from '@/components/ui/verdict-mark';
import { count } from '../numbers';
import { Time } from '../time';

interface Report {
  atIso: string;
  entries: number;
  runs: number;
  chains: { chain: string; entries: number }[];
  breaks: { chain: string; place: number; sentence: string }[];
}

/** Recomputes every seal when asked, and says what came of it. */
export function VerifyTrail({
  verify,
  checkpointAtIso,
}: {
  verify: () => Promise<Report>;
  checkpointAtIso: string | null;
}) {
  const [report, setReport] = useState<Report | 'failed' | null>(null);
  const [working, start] = useTransition();
  const check = () =>
    start(async () => {
      setReport(await verify().catch(() => 'failed' as const));
    });
  return (
    <div className="my-4 flex flex-wrap items-center justify-between gap-4" aria-live="polite">
      <div className="text-lede leading-snug">
        {working ? (
          'Recomputing every seal.'
        ) : report === 'failed' ? (
          'The check did not finish. Try again.'
        ) : report ? (
          <Result report={report} />
        ) : (
          <span className="text-body text-ink-2">
            {checkpointAtIso ? (
              <>
                Heads of the chains were last kept <Time iso={checkpointAtIso} />.
              </>
            ) : (
              'Heads of the chains are kept once a day.'
            )}
          </span>
        )}
      </div>
      <span className="sw-screen-only">
        <Button kind="filled" onClick={check} pending={working ? 'Checking' : null}>
          Verify the chain now
        </Button>
      </span>
    </div>
  );
}

function Result({ report }: { report: Report }) {
  if (report.breaks.length > 0)
    return (
      <div className="grid gap-2">
        {report.breaks.map(({ chain, place, sentence }) => (
          <p key={`${chain} ${place}`} className="flex items-baseline gap-3">
            <VerdictMark shape="reject" size={20} />
            <span>
              <b className="text-reject">Chain {chain} is broken.</b> {sentence}
            </span>
          </p>
        ))}
      </div>
    );
  return (
    <p className="flex items-baseline gap-3">
      <VerdictMark shape="pass" size={20} />
      <span>
        <b>Chain unbroken.</b> <b>{count(report.entries)}</b> entries in {report.chains.length} chains and the records
        of {count(report.runs)} runs checked at <Time iso={report.atIso} format="short-clock" />.
      </span>
    </p>
  );
}

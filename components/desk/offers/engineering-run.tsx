import Link from 'next/link';
import { PageHead } from '@/components/ui/page-head';
import { SerialStrip } from '@/components/ui/serial-strip';
import { TrialMark } from '@/components/ui/trial-mark';
import type { EngineeringRunPage } from '@/lib/contracts/engineering-offer';
import { RunBlock } from '../units/run-block';

/** The record of one engineering run: which draft, which board, what came of it. */
export function EngineeringRun({ page }: { page: EngineeringRunPage }) {
  const { run, serial, boardTypeCode } = page;
  const longest = Math.max(...run.traces.map((trace) => (trace.atMs.at(-1) ?? 0) / 1000), 1);
  return (
    <>
      <PageHead
        title={<SerialStrip serial={serial} boardTypeCode={boardTypeCode} />}
        lede={
          <span className="inline-flex items-center gap-3">
            <TrialMark size={24} />
            Engineering run. Not production: it counts in no yield.
          </span>
        }
      />
      <p className="mb-4">
        Draft r{page.revisionNumber} of{' '}
        <Link className="sw-link" href={`/sequences/${page.sequenceId}`}>
          {page.sequenceName}
        </Link>
        , offered by {page.offeredByName}.{page.note ? ` “${page.note}”` : ''}{' '}
        {page.isUnit ? (
          <Link className="sw-link" href={`/units/${encodeURIComponent(serial)}`}>
            All runs of this board
          </Link>
        ) : (
          'A spare board that belongs to no lot.'
        )}
      </p>
      <RunBlock run={run} mostSeconds={longest} />
    </>
  );
}

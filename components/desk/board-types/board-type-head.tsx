'use client';

import Link from 'next/link';
import type { ReactNode } from 'react';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { BoardTypePage } from '@/lib/contracts/board-type-revision';
import { Time } from '../time';

interface BoardTypeHeadProps {
  page: BoardTypePage;
  name: string;
  errors: number;
  actions: ReactNode;
}

/** Code, what is shown and what stations use, how much is to be put right, and the buttons. */
export function BoardTypeHead({ page: { code, shown, inUse }, name, errors, actions }: BoardTypeHeadProps) {
  const words = {
    draft: 'Draft',
    submitted: 'Waits for quality: revision',
    approved: 'Revision',
    superseded: 'Revision',
    withdrawn: 'Discarded draft',
  };
  return (
    <div className="mb-5 flex flex-wrap items-center justify-between gap-x-8 gap-y-3">
      <div className="flex flex-wrap items-baseline gap-x-6 gap-y-1">
        <h1 className="text-title leading-tight font-bold max-sm:text-[26px]">{code}</h1>
        <p className="text-ink-2">
          {name}.{' '}
          <b className="text-ink">
            {words[shown.status]} {shown.number}
          </b>
          {inUse && inUse.id !== shown.id ? (
            <>
              , new lots take <b className="text-ink">{inUse.number}</b>
            </>
          ) : inUse ? (
            ', in use'
          ) : (
            ', nothing is approved yet'
          )}
          {inUse?.approvedAtIso ? (
            <>
              {' '}
              since <Time iso={inUse.approvedAtIso} format="day" />
            </>
          ) : null}
          .{' '}
          <Link className="sw-link" href={`/board-types/${encodeURIComponent(code)}/hold-rules`}>
            What holds its lots
          </Link>
        </p>
      </div>
      <div className="flex flex-wrap items-center gap-3">
        <span role="status">
          {errors > 0 ? (
            <span className="flex items-center gap-2 font-bold text-reject">
              <VerdictMark shape="reject" size={14} />
              {errors} {errors === 1 ? 'error' : 'errors'} to fix
            </span>
          ) : null}
        </span>
        {actions}
      </div>
    </div>
  );
}

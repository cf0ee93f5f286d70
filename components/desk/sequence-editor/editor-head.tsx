'use client';

import Link from 'next/link';
import { Button } from '@/components/ui/button';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { DraftPage } from '@/lib/contracts/sequence-draft';
import { errorCount } from '@/lib/sequence/draft-problems';
import { Time } from '../time';
import { SavedWords } from './saved-words';
import type { SaveState } from './use-autosave';

interface EditorHeadProps {
  page: DraftPage;
  saveState: SaveState;
  unsaved: boolean;
  savedAtIso: string;
  unread: number;
  errors: number;
  onNextError: () => void;
  /** Absent: this person may not. */
  onTry?: () => void;
  onSubmit?: () => void;
  submitBlocked: string | null;
}

/** What is open and how it stands, what stations run meanwhile, and what can be done with it. */
export function EditorHead(props: EditorHeadProps) {
  const { page, errors, onNextError, onTry, onSubmit, submitBlocked } = props;
  const { head, released, sequenceId } = page;
  const errorWords = errorCount(errors);
  return (
    <div className="mb-4 grid items-center gap-x-8 gap-y-3 lg:grid-cols-[minmax(0,1fr)_auto]">
      <div className="flex flex-wrap items-baseline gap-x-6 gap-y-1">
        <h1 className="text-title leading-tight font-bold max-sm:text-[26px]">{page.sequenceName}</h1>
        <p className="text-ink-2">
          <b className="text-ink">
            {head.status === 'draft' ? 'Draft' : 'Revision'} r{head.number}
          </b>
          , <SavedWords {...props} />{' '}
          {released ? (
            <>
              Stations still run <b className="text-ink">r{released.head.number}</b>
              {released.head.releasedAtIso ? (
                <>
                  , released <Time iso={released.head.releasedAtIso} format="day" />
                </>
              ) : null}
              .{' '}
            </>
          ) : head.status === 'released' ? (
            'Stations run it. '
          ) : (
            'None is released yet. '
          )}
          <Link className="sw-link" href={`/sequences/${sequenceId}`}>
            History
          </Link>
        </p>
      </div>
      <div className="flex flex-wrap items-center gap-3 lg:justify-end">
        {errorWords ? (
          <button
            type="button"
            onClick={onNextError}
            className="inline-flex min-h-9 items-center gap-1.5 font-bold text-reject underline underline-offset-4 max-sm:min-h-[46px]"
          >
            <VerdictMark shape="reject" size={15} />
            {errorWords}
          </button>
        ) : null}
        {onTry ? <Button onClick={onTry}>Try on a station…</Button> : null}
        {onSubmit ? (
          <Button onClick={onSubmit} unavailable={submitBlocked}>
            Submit r{head.number}…
          </Button>
        ) : null}
      </div>
    </div>
  );
}

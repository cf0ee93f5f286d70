'use client';

import Link from 'next/link';
import { useId, useState, type ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import type { BoardType } from '@/lib/contracts/board-type';
import { usualDryRun } from '@/lib/contracts/dry-run';
import { FormProblem } from '../form-problem';
import { LimitHistograms } from './limit-histograms';
import { RunProgress } from './run-progress';
import { RunRails } from './run-rails';
import { RunSentence } from './run-sentence';
import { parseSettings, SettingsSentence, typedSettings } from './settings-sentence';
import type { DryRunHandle } from './use-dry-run';

export interface DryRunPaneProps {
  /** From `useDryRun`: the editor holds it too, to lock its fields while `isAtWork` and to fill the lost-boards column. */
  dryRun: DryRunHandle;
  /** Its limits stand on the rails. */
  boardType: BoardType;
  revisionNumber: number;
  /** Version of the draft as saved now: a dry run of an older one is said to be of an earlier text. */
  draftVersion: number;
  /** The run's own page, with its tables. */
  addressOf(dryRunId: string): string;
  stations: readonly { code: string; name: string }[];
  /** Why no dry run can start now, such as an error in the draft; null: it can. */
  blocked: string | null;
  /** Laid over the rails, such as the grip on the trim's target. */
  overRails?: ReactNode;
}

/** The right column of the sequence editor: rails with what simulated boards gave, the yield sentence, settings. */
export function DryRunPane(props: DryRunPaneProps) {
  const { dryRun, boardType, revisionNumber, draftVersion, addressOf, stations, blocked, overRails } = props;
  const { view, isAtWork, problem, asking } = dryRun;
  const [typed, setTyped] = useState(() => typedSettings(view?.settings ?? usualDryRun));
  const [wrong, setWrong] = useState<{ field: keyof typeof typed; sentence: string } | null>(null);
  const problemId = useId();

  function start(): void {
    const parsed = parseSettings(typed);
    if ('field' in parsed) return setWrong(parsed);
    setWrong(null);
    void dryRun.start(parsed.settings);
  }

  const result = view?.result ?? null;
  const releasedName = view?.releasedNumber == null ? null : `r${view.releasedNumber}`;
  return (
    <section aria-label={`Dry run of r${revisionNumber}`} className="grid gap-3">
      <div className="mx-auto w-full max-w-[460px]">
        <div className="relative">
          <RunRails
            boardType={boardType}
            result={result}
            draftName={`r${revisionNumber}`}
            releasedName={releasedName}
          />
          {overRails}
        </div>
        {result ? <LimitHistograms limits={boardType.limits} result={result} /> : null}
      </div>
      <div className="border-t-2 border-ink pt-2.5">
        <h2 className="mb-1 font-bold">Dry run of r{revisionNumber}</h2>
        {isAtWork && view ? <RunProgress view={view} /> : null}
        {view && result ? <RunSentence view={view} result={result} /> : null}
        {view && !isAtWork ? (
          <p className="mt-1 text-cap text-ink-2">
            {view.state === 'failed' ? `${view.problem} ` : ''}
            {view.state === 'cancelled' ? 'Stopped before its end: these are the boards that were done. ' : ''}
            {view.draftVersion < draftVersion ? 'The draft has changed since. ' : ''}
            {result ? (
              <Link href={addressOf(view.id)} className="text-accent underline underline-offset-4">
                Everything it found
              </Link>
            ) : null}
          </p>
        ) : null}
      </div>
      <div className="border-t-2 border-ink pt-2">
        <SettingsSentence
          typed={typed}
          onChange={setTyped}
          stations={stations}
          locked={isAtWork}
          wrong={wrong?.field ?? null}
          problemId={problemId}
        />
        <div id={problemId}>
          <FormProblem problem={wrong?.sentence ?? problem} />
        </div>
        <div className="mt-2 flex flex-wrap gap-3">
          {isAtWork ? (
            <Button kind="stop" onClick={() => void dryRun.stop()} pending={asking ? 'Stopping' : null}>
              Stop the dry run
            </Button>
          ) : (
            <Button onClick={start} unavailable={blocked} pending={asking ? 'Starting' : null}>
              {view ? 'Run again' : 'Start a dry run'}
            </Button>
          )}
          {view?.state === 'done' ? (
            <Button kind="link" onClick={() => void dryRun.keep(!view.kept)}>
              {view.kept ? 'Kept with the revision. Let it go' : 'Keep it with the revision'}
            </Button>
          ) : null}
        </div>
      </div>
    </section>
  );
}

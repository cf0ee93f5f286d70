'use client';

import { Button, ButtonLink } from '@/components/ui/button';
import { PageHead, Section } from '@/components/ui/page-head';
import type { DryRunPage } from '@/lib/contracts/dry-run';
import { stepWord } from '@/lib/sequence/value-words';
import { FormProblem } from '../form-problem';
import { count } from '../numbers';
import { Time } from '../time';
import { CostsAndGains } from './costs-and-gains';
import { LimitHistograms } from './limit-histograms';
import { LostBoards, LostDifference } from './lost-boards';
import { lostAtSteps } from './lost-at';
import { RunProgress } from './run-progress';
import { RunRails } from './run-rails';
import { RunSentence } from './run-sentence';
import { RunFigures, RunReasons, RunSpreads } from './run-tables';
import { SettlingChart } from './settling-chart';
import { useDryRun, type DryRunActions } from './use-dry-run';

interface DryRunLiveProps {
  page: DryRunPage;
  /** Null: this person may only look. */
  actions: DryRunActions | null;
}

const lookOnly: DryRunActions = {
  ask: () => Promise.reject(new Error('look only')),
  cancel: () => Promise.reject(new Error('look only')),
  keep: () => Promise.reject(new Error('look only')),
};

/** A dry run whole, while it runs and ever after: charts with their tables behind. */
export function DryRunLive({ page, actions }: DryRunLiveProps) {
  const { sequence, boardType, sequenceName, sequenceId, revisionId } = page;
  const dryRun = useDryRun({ revisionId, initial: page.view, actions: actions ?? lookOnly });
  const view = dryRun.view ?? page.view;
  const { result } = view;
  const draftName = `r${view.revisionNumber}`;
  const releasedName = view.releasedNumber === null ? null : `r${view.releasedNumber}`;
  const names = { draftName, releasedName };
  return (
    <>
      <PageHead
        title={sequenceName}
        lede={
          <>
            Dry run of <b>{draftName}</b>, asked by {view.askedBy} <Time iso={view.askedAtIso} />. {settingsWords(page)}
          </>
        }
        actions={
          <>
            {releasedName ? (
              <ButtonLink href={`/sequences/${sequenceId}/compare?a=${releasedName}&b=${draftName}`}>
                Compare {releasedName} and {draftName}
              </ButtonLink>
            ) : null}
            {actions && dryRun.isAtWork ? (
              <Button kind="stop" onClick={() => void dryRun.stop()}>
                Stop the dry run
              </Button>
            ) : null}
            {actions && view.state === 'done' ? (
              <Button onClick={() => void dryRun.keep(!view.kept)}>
                {view.kept ? 'Let it go' : 'Keep it with the revision'}
              </Button>
            ) : null}
          </>
        }
      />
      <FormProblem problem={dryRun.problem ?? view.problem} />
      <div className="grid items-start gap-x-11 lg:grid-cols-[minmax(0,2fr)_minmax(0,1fr)]">
        <div>
          <StepsLost page={page} view={view} />
          {result ? (
            <Section
              title={dryRun.isAtWork ? 'Yield as it settles' : 'Yield as it settled'}
              aside={
                <span className="text-cap text-ink-2">
                  grey: where the final figure lies, 95 of 100 times; same {count(view.settings.boards)} boards for both
                </span>
              }
            >
              <SettlingChart result={result} boards={view.settings.boards} running={dryRun.isAtWork} {...names} />
            </Section>
          ) : null}
        </div>
        <aside className="border-t-2 border-ink pt-2.5 max-lg:mt-8">
          <div className="mx-auto max-w-[440px]">
            <RunRails boardType={boardType} result={result} {...names} />
            {result ? <LimitHistograms limits={boardType.limits} result={result} /> : null}
          </div>
          <div className="mt-3 grid gap-2 border-t-2 border-ink pt-2.5">
            <h2 className="font-bold">
              {releasedName ? `${draftName} against ${releasedName}` : `Dry run of ${draftName}`}
            </h2>
            {dryRun.isAtWork ? <RunProgress view={view} /> : null}
            {result ? <RunSentence view={view} result={result} /> : null}
            {view.state === 'cancelled' ? <p>Stopped before its end: these are the boards that were done.</p> : null}
          </div>
          {result && result.changesAlone.length > 0 ? (
            <div className="mt-3 border-t-2 border-ink pt-2.5">
              <h2 className="mb-1 font-bold">What costs and what gains</h2>
              <CostsAndGains view={view} sequence={sequence} />
            </div>
          ) : null}
        </aside>
      </div>
      {result ? (
        <>
          <Section title="Figures">
            <RunFigures result={result} sequence={sequence} {...names} />
          </Section>
          <Section title="Why boards were rejected">
            <RunReasons result={result} sequence={sequence} {...names} />
          </Section>
          <details className="mt-8 border-t-2 border-ink pt-2.5">
            <summary className="cursor-pointer font-bold">Trip and release in numbers</summary>
            <RunSpreads result={result} {...names} />
          </details>
        </>
      ) : null}
    </>
  );
}

function settingsWords({ view: { settings } }: DryRunPage): string {
  const { boards, defectRate, turnErrorRelative, turnErrorDegrees, stationCode, seed } = settings;
  const percentOf = (share: number) => `${Number((share * 100).toFixed(2))} %`;
  return `${count(boards)} boards, ${percentOf(defectRate)} with a defect, turned within ${percentOf(turnErrorRelative)} and ${turnErrorDegrees} degrees, at ${stationCode ? `station ${stationCode}` : 'a usual station'}, seed ${seed}.`;
}

/** The steps with the boards that each of them lost. */
function StepsLost({ page: { sequence, releasedSequence }, view }: { page: DryRunPage; view: DryRunPage['view'] }) {
  const lost = lostAtSteps(
    view.result,
    sequence.steps.map(({ id }) => id),
  );
  const changed = (id: string) => {
    const was = releasedSequence?.steps.find((step) => step.id === id);
    const is = sequence.steps.find((step) => step.id === id);
    return releasedSequence !== null && JSON.stringify(was) !== JSON.stringify(is);
  };
  const each = lost?.values().next().value?.boardsASquare ?? 1;
  return (
    <table className="w-full border-t-2 border-ink">
      <caption className="pb-1 pt-2 text-left text-cap text-ink-2">
        Boards lost{view.result ? ` of ${count(view.result.draft.firstPass.of)}` : ''}: solid r{view.revisionNumber}
        {view.releasedNumber === null ? '' : `, hollow r${view.releasedNumber}`}
        {each > 1 ? `; one square is ${each}` : ''}
      </caption>
      <thead className="sr-only">
        <tr>
          <th scope="col">Step</th>
          <th scope="col">Boards lost</th>
          <th scope="col">Difference</th>
        </tr>
      </thead>
      <tbody>
        {sequence.steps.map((step, i) => {
          const here = lost?.get(step.id);
          return (
            <tr key={step.id} className="h-[43px] border-b border-hair">
              <th scope="row" className="text-left font-normal">
                <span className="flex items-center gap-3">
                  <span aria-hidden="true" className={`h-7 w-1.5 flex-none ${changed(step.id) ? 'bg-ink' : ''}`} />
                  <span className="w-6 text-right font-num">{i + 1}</span>
                  <b>{stepWord(step)}</b>
                  {changed(step.id) ? <span className="sr-only">changed</span> : null}
                  {step.enabled ? null : <span className="text-ink-2">switched off</span>}
                </span>
              </th>
              <td>{here ? <LostBoards lost={here} /> : null}</td>
              <td className="text-right">{here ? <LostDifference lost={here} /> : null}</td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}

'use client';

import Link from 'next/link';
import { useCallback, useMemo, useState } from 'react';
import { PredictedSupply } from '@/components/charts/predicted-supply';
import { useToast } from '@/components/ui/toast';
import type { DryRunView } from '@/lib/contracts/dry-run';
import type { OfferedDraft } from '@/lib/contracts/engineering-offer';
import type { DraftPage } from '@/lib/contracts/sequence-draft';
import type { Draft } from '@/lib/sequence/draft';
import { mostSteps } from '@/lib/sequence/draft-edits';
import { errorsOf, submitBlocked, unreasoned } from '@/lib/sequence/draft-problems';
import { firstOf } from '@/lib/sequence/enabled-steps';
import { stepWord } from '@/lib/sequence/value-words';
import { DryRunPane } from '../dry-run/dry-run-pane';
import { lostAtSteps } from '../dry-run/lost-at';
import { railsFor } from '../dry-run/run-rails';
import { useDryRun } from '../dry-run/use-dry-run';
import { OfferResults } from '../offers/offer-results';
import { editorId, goTo } from './blank-ids';
import { ChangesList } from './changes-list';
import { EditorContext, type EditorView } from './editor-context';
import { EditorHead } from './editor-head';
import { useEditorKeys } from './editor-keys';
import { EditorNotes } from './editor-notes';
import { LeaveGuard } from './leave-guard';
import { ListFoot } from './list-foot';
import { lockOf } from './lock-of';
import { RuleSentence } from './rule-sentence';
import { useStepCommands } from './step-commands';
import { StepList } from './step-list';
import { StationChoice } from './station-choice';
import { EditorDialogs, type EditorActions, type OpenDialog } from './editor-dialogs';
import { TargetGrip } from './target-grip';
import { useDraft } from './use-draft';
import { useDraftFacts } from './use-draft-facts';

interface SequenceEditorProps {
  page: DraftPage;
  /** The newest dry run of this revision. */
  dryRun: DryRunView | null;
  offers: OfferedDraft[];
  actions: EditorActions;
}

/** The draft of a sequence: steps as sentences, checked, predicted and saved as they are typed. */
export function SequenceEditor({ page, dryRun: newest, offers, actions }: SequenceEditorProps) {
  const { head, boardType, released, stations } = page;
  const toast = useToast();
  const [selectedId, select] = useState<string | null>(null);
  const [stationCode, setStation] = useState<string | null>(null);
  const [open, setOpen] = useState<OpenDialog>(null);
  const [said, say] = useState('');
  const [errorAt, setErrorAt] = useState(-1);
  const { editor, dispatch, saving, presence, isKept } = useDraft({ page, selectedId, save: actions.save });
  const dryRun = useDryRun({ revisionId: head.id, initial: newest, actions: actions.dryRun });
  const draft = editor.history.present;
  const { steps } = draft.sequence;
  const facts = useDraftFacts(page, draft.sequence, stationCode);
  const locked = lockOf(page, presence?.status ?? head.status, dryRun.isAtWork);

  const edit = useCallback(
    (change: (now: Draft) => Draft, group?: string) => dispatch({ kind: 'edit', change, group }),
    [dispatch],
  );
  const endGroup = useCallback(() => dispatch({ kind: 'end-group' }), [dispatch]);
  const addAfter = (stepId: string | null) =>
    steps.length < mostSteps ? setOpen({ addAfter: stepId }) : toast(`A sequence holds at most ${mostSteps} steps.`);
  const commands = useStepCommands({ draft, edit, select, addAfter, say });

  const errors = useMemo(() => errorsOf(draft, facts.findings), [draft, facts.findings]);
  const blocked = submitBlocked({
    errors: errors.length,
    unreasoned: unreasoned(draft, facts.findings).length,
    conflicts: draft.conflicts.length,
    unsaved: saving.unsaved || saving.state.kind !== 'idle',
  });
  function nextError(): void {
    const next = (errorAt + 1) % Math.max(1, errors.length);
    setErrorAt(next);
    const place = errors[next];
    if (place) goTo(place);
  }
  const move = (kind: 'undo' | 'redo') => dispatch({ kind });

  useEditorKeys({
    selectedId,
    locked: locked !== null,
    commands,
    undo: () => move('undo'),
    redo: () => move('redo'),
    nextError,
    showKeys: () => setOpen('keys'),
  });

  const view: EditorView = {
    draft,
    boardType,
    locked,
    edit,
    endGroup,
    findings: facts.findings,
    comparison: facts.comparison,
    releasedName: released ? `r${released.head.number}` : null,
    selectedId,
    select,
  };
  const trim = firstOf(draft.sequence, 'trim');
  const lostAt = dryRun.isAtWork
    ? lostAtSteps(
        dryRun.view?.result ?? null,
        steps.map(({ id }) => id),
      )
    : null;

  return (
    <EditorContext value={view}>
      <div id={editorId}>
        <EditorHead
          page={page}
          saveState={saving.state}
          unsaved={saving.unsaved}
          savedAtIso={editor.saved.savedAtIso}
          unread={Object.keys(draft.unread).length}
          errors={errors.length}
          onNextError={nextError}
          onTry={actions.offer && head.status === 'draft' ? () => setOpen('offer') : undefined}
          onSubmit={page.mayEdit ? () => setOpen('submit') : undefined}
          submitBlocked={dryRun.isAtWork ? 'A dry run is at work.' : blocked}
        />
        <div className="grid grid-cols-[minmax(0,1fr)] gap-x-11 gap-y-8 xl:grid-cols-[minmax(0,1fr)_424px]">
          <div className="min-w-0">
            <EditorNotes others={presence?.others ?? []} steps={steps} lostAt={lostAt} />
            <div className="border-t-2 border-ink">
              <RuleSentence />
              <StepList commands={commands} seconds={facts.seconds} lostAt={lostAt} />
            </div>
            <ListFoot
              history={editor.history}
              onAdd={() => addAfter(selectedId ?? steps.at(-2)?.id ?? null)}
              onUndo={() => move('undo')}
              onRedo={() => move('redo')}
              onKeys={() => setOpen('keys')}
            />
            <div className="mt-4">
              {facts.prediction ? (
                <PredictedSupply
                  prediction={facts.prediction}
                  limits={boardType.limits}
                  steps={steps.map((step, i) => ({ id: step.id, number: i + 1, name: stepWord(step) }))}
                  selectedId={selectedId}
                  onSelect={select}
                  note={<StationChoice stations={stations} chosen={stationCode} onChoose={setStation} />}
                />
              ) : (
                <p className="min-h-[300px] text-ink-2">Playing the draft on one typical board.</p>
              )}
            </div>
          </div>
          <div className="grid min-w-0 content-start gap-5">
            <div className="border-t-2 border-ink pt-2">
              <p className="text-right text-cap text-ink-2">
                Limits belong to{' '}
                <Link className="sw-link" href={`/board-types/${boardType.code}`}>
                  {boardType.code}
                </Link>
              </p>
              <DryRunPane
                dryRun={dryRun}
                boardType={boardType}
                revisionNumber={head.number}
                draftVersion={editor.saved.version}
                addressOf={(run) => `/sequences/${page.sequenceId}/dry-runs/${run}`}
                stations={stations}
                blocked={dryRunBlocked(page.mayEdit, errors.length, saving.unsaved)}
                overRails={trim ? <TargetGrip trim={trim} scale={railsFor(boardType)} /> : null}
              />
            </div>
            <ChangesList
              compareAddress={`/sequences/${page.sequenceId}/compare?a=r${released?.head.number}&b=r${head.number}`}
            />
          </div>
        </div>
        <OfferResults revisionId={head.id} initial={offers} endOffer={actions.endOffer} />
      </div>
      <p role="status" className="sr-only">
        {said}
      </p>
      <EditorDialogs
        page={page}
        open={open}
        onClose={() => setOpen(null)}
        version={editor.saved.version}
        actions={actions}
      />
      <LeaveGuard unsaved={isKept && page.mayEdit} />
    </EditorContext>
  );
}

function dryRunBlocked(mayEdit: boolean, errors: number, unsaved: boolean): string | null {
  if (!mayEdit) return 'Only a draft that you may edit is run.';
  if (errors > 0) return 'Errors first.';
  return unsaved ? 'Not saved yet.' : null;
}

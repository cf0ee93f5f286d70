'use client';

import { useState } from 'react';
import { Notice } from '@/components/ui/notice';
import { useToast } from '@/components/ui/toast';
import { applyFix } from '@/lib/circuit/monte-carlo/apply-fix';
import { fixLabel, missSentence } from '@/lib/circuit/monte-carlo/finding-words';
import type { LimitFix } from '@/lib/circuit/monte-carlo/types';
import type { BoardTypePage } from '@/lib/contracts/board-type-revision';
import type { FileFacts } from '@/lib/contracts/file-upload';
import { BoardTypeHead } from './board-type-head';
import { CircuitSection } from './circuit-section';
import { DraftActions, type BoardTypeActions } from './draft-actions';
import { FormProvider } from './form-context';
import { LabelSection } from './label-section';
import { LeaveDialog } from './leave-dialog';
import { LimitsSection } from './limits-section';
import { Misfits } from './misfits';
import { PicturesSection } from './pictures-section';
import { PredictionPane } from './prediction-pane';
import { RevisionHistory } from './revision-history';
import { SearchSection } from './search-section';
import { SerialSection } from './serial-section';
import { TrimmerSection } from './trimmer-section';
import { useDraftForm } from './use-draft-form';
import { usePrediction } from './use-prediction';

interface BoardTypeEditorProps {
  page: BoardTypePage;
  signer: string;
  actions: BoardTypeActions;
}

/** A board type: its circuit with all that is tested against it, and beside it what its parts make of its limits. */
export function BoardTypeEditor({ page, signer, actions }: BoardTypeEditorProps) {
  const { shown } = page;
  const readOnly = shown.status !== 'draft' || !page.mayEdit;
  const draft = useDraftForm(shown, readOnly);
  const { access, boardType, findings, unreadable } = draft;
  // What cannot be read now leaves the last prediction in sight.
  const [readable, setReadable] = useState(shown.specification);
  if (boardType && boardType !== readable) setReadable(boardType);
  const { prediction, working } = usePrediction(readable);
  const [stored, setStored] = useState<FileFacts[]>([]);
  const toast = useToast();

  const misses = prediction?.findings.map((finding) => missSentence(finding, prediction.targetVolts)) ?? [];
  const ruleErrors = findings.filter(({ severity }) => severity === 'error').length;
  const errors = Object.keys(unreadable).length + ruleErrors + misses.length;

  function fix(change: LimitFix): void {
    const before = access.form;
    draft.take(applyFix(readable, change));
    toast(`${fixLabel(change).replace(/^Use /, '')} is filled in.`, () => draft.replace(before));
  }

  return (
    <FormProvider value={access}>
      <BoardTypeHead
        page={page}
        name={access.form.name}
        errors={errors}
        actions={<DraftActions page={page} signer={signer} draft={draft} misses={misses} actions={actions} />}
      />
      <div className="grid gap-2 empty:hidden">
        {draft.restored ? (
          <Notice>
            What you typed here before and did not save is shown again.{' '}
            <button type="button" className="sw-link" onClick={draft.revert}>
              Go back to what is saved
            </button>
          </Notice>
        ) : null}
        {shown.status === 'draft' && shown.sentBackBy ? (
          <Notice>
            {shown.sentBackBy} sent it back: {shown.sentBackReason}
          </Notice>
        ) : null}
        {shown.status === 'submitted' ? (
          <Notice>
            {shown.submittedBy} asks quality to approve it: {shown.note}
          </Notice>
        ) : null}
        <Misfits misfits={page.misfits} />
      </div>
      <div className="grid gap-x-11 min-[1280px]:grid-cols-[minmax(0,856px)_minmax(300px,1fr)]">
        <div className="min-w-0">
          <CircuitSection />
          <LimitsSection />
          <RevisionHistory history={page.history} openLots={page.openLots} />
          <TrimmerSection />
          <SearchSection />
          <SerialSection />
          <LabelSection code={page.code} limits={readable.limits} />
          <PicturesSection files={[...page.files, ...stored]} onStored={(file) => setStored((all) => [...all, file])} />
        </div>
        <div className="min-w-0 min-[1280px]:sticky min-[1280px]:top-4 min-[1280px]:mt-8 min-[1280px]:self-start">
          <PredictionPane
            boardType={readable}
            prediction={prediction}
            working={working}
            unit={access.form.travelUnit}
            onFix={readOnly ? null : fix}
          />
        </div>
      </div>
      <LeaveDialog unsaved={draft.dirty && !readOnly} />
    </FormProvider>
  );
}

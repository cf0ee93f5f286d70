'use client';

import { useRouter } from 'next/navigation';
import { useToast } from '@/components/ui/toast';
import type { Outcome } from '@/lib/contracts/outcome';
import type { DraftPage, SavedDraft, SaveDraft } from '@/lib/contracts/sequence-draft';
import { changeSentences } from '@/lib/sequence/change-sentences';
import { freshStep, insertStep } from '@/lib/sequence/draft-edits';
import type { Step, StepKind } from '@/lib/sequence/step';
import { stepWord } from '@/lib/sequence/value-words';
import type { DryRunActions } from '../dry-run/use-dry-run';
import { OfferDialog, type OfferDraft } from '../offers/offer-dialog';
import { AddStepDialog } from './add-step-dialog';
import { goTo } from './blank-ids';
import { useEditor } from './editor-context';
import { KeysDialog } from './keys-dialog';
import { newId } from './new-id';
import { SubmitDialog, type SubmitRevision } from './submit-dialog';

/** What the editor asks of the server. Null: this person may not. */
export interface EditorActions {
  save: (form: SaveDraft) => Promise<Outcome<SavedDraft>>;
  submit: (form: SubmitRevision) => Promise<Outcome>;
  dryRun: DryRunActions;
  offer: ((input: OfferDraft) => Promise<Outcome<{ offerId: string }>>) | null;
  endOffer: ((input: { offerId: string }) => Promise<Outcome>) | null;
}

export type OpenDialog = null | 'keys' | 'submit' | 'offer' | { addAfter: string | null };

interface EditorDialogsProps {
  page: DraftPage;
  open: OpenDialog;
  onClose: () => void;
  /** Version of the draft as it is saved. */
  version: number;
  actions: Pick<EditorActions, 'submit' | 'offer'>;
}

/** The sheets of the editor, one at a time. */
export function EditorDialogs({ page, open, onClose, version, actions }: EditorDialogsProps) {
  const { head, sequenceId, boardType } = page;
  const { draft, edit, select, comparison } = useEditor();
  const router = useRouter();
  const toast = useToast();
  const adding = typeof open === 'object' && open !== null;
  const place = adding ? open.addAfter : null;

  function add(kind: StepKind): void {
    const id = newId();
    edit((now) => insertStep(now, freshStep(kind, id, boardType), place));
    onClose();
    select(id);
    setTimeout(() => goTo({ stepId: id, field: null }));
  }

  return (
    <>
      <AddStepDialog open={adding} onClose={onClose} where={whereAfter(draft.sequence.steps, place)} onAdd={add} />
      <KeysDialog open={open === 'keys'} onClose={onClose} />
      <SubmitDialog
        open={open === 'submit'}
        onClose={onClose}
        number={head.number}
        revisionId={head.id}
        version={version}
        changes={comparison ? changeSentences(comparison) : []}
        submit={actions.submit}
        onSubmitted={() => {
          toast(`r${head.number} waits for its release.`);
          router.push(`/sequences/${sequenceId}`);
        }}
      />
      {actions.offer ? (
        <OfferDialog
          open={open === 'offer'}
          onClose={onClose}
          revisionId={head.id}
          revisionNumber={head.number}
          offer={actions.offer}
          onOffered={(station) => {
            onClose();
            toast(`Station ${station} has r${head.number} on offer.`);
            router.refresh();
          }}
        />
      ) : null}
    </>
  );
}

function whereAfter(steps: readonly Step[], stepId: string | null): string {
  const at = steps.findIndex(({ id }) => id === stepId);
  return at < 0 ? 'at the beginning' : `after step ${at + 1}, ${stepWord(steps[at]!)}`;
}

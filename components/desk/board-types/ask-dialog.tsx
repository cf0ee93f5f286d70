'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { TextAreaField } from '@/components/ui/text-area-field';
import { askApprovalSchema, type SequenceMisfit } from '@/lib/contracts/board-type-revision';
import type { Outcome } from '@/lib/contracts/outcome';
import { FormProblem } from '../form-problem';
import { useActionForm } from '../use-action-form';
import { Misfits } from './misfits';
import { Misses } from './misses';

interface AskDialogProps {
  revisionId: string;
  version: number;
  number: number;
  /** Sentences about limits that boards miss; the note says why they stand. */
  misses: readonly string[];
  misfits: readonly SequenceMisfit[];
  onClose: () => void;
  ask: (input: unknown) => Promise<Outcome>;
  onDone: () => void;
}

/** Asks quality for approval, with what changed and why. */
export function AskDialog({ revisionId, version, number, misses, misfits, onClose, ask, onDone }: AskDialogProps) {
  const form = useForm({ resolver: zodResolver(askApprovalSchema), defaultValues: { revisionId, version, note: '' } });
  const { send, problem, sending } = useActionForm(form, ask, onDone);
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Ask quality to approve revision ${number}?`}
      consequence="It cannot be changed while it waits. Lots that are open keep their limits; new lots take these once they are approved."
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Asking' : null}>
            Ask for approval
          </Button>
          <Button kind="link" onClick={onClose}>
            Go on with the draft
          </Button>
        </>
      }
    >
      <Misses misses={misses} ask="Say why they stand." />
      <Misfits misfits={misfits} />
      <TextAreaField
        {...form.register('note')}
        label="What changed and why"
        error={form.formState.errors.note?.message}
      />
      <FormProblem problem={problem} />
    </Dialog>
  );
}

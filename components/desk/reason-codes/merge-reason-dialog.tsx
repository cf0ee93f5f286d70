'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { SelectField } from '@/components/ui/select-field';
import type { Outcome } from '@/lib/contracts/outcome';
import { mergeReasonCodeSchema, type MergeReasonCodeForm, type ReasonCodeRow } from '@/lib/contracts/reason-code';
import { FormProblem } from '../form-problem';
import { useActionForm } from '../use-action-form';

interface MergeReasonDialogProps {
  row: ReasonCodeRow;
  /** Reasons of the same kind that are offered. */
  others: readonly ReasonCodeRow[];
  merge: (input: unknown) => Promise<Outcome>;
  onClose: () => void;
  onDone: (said: string) => void;
}

export function MergeReasonDialog({ row, others, merge, onClose, onDone }: MergeReasonDialogProps) {
  const form = useForm<MergeReasonCodeForm>({
    resolver: zodResolver(mergeReasonCodeSchema),
    defaultValues: { id: row.id, intoId: '' },
  });
  const { send, problem, sending } = useActionForm(form, merge, () => onDone(`“${row.word}” is merged`));
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Merge “${row.word}”?`}
      consequence="It is offered no more, and the other one counts in its place. This cannot be undone. Records keep the old word."
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Storing' : null}>
            Merge
          </Button>
          <Button kind="link" onClick={onClose}>
            Keep both
          </Button>
        </>
      }
    >
      <SelectField
        {...form.register('intoId')}
        label="Counts in its place"
        choices={[{ value: '', label: 'choose' }, ...others.map(({ id, word }) => ({ value: id, label: word }))]}
        error={form.formState.errors.intoId?.message}
      />
      <FormProblem problem={problem} />
    </Dialog>
  );
}

'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { TextAreaField } from '@/components/ui/text-area-field';
import type { Outcome } from '@/lib/contracts/outcome';
import { submitRevisionSchema } from '@/lib/contracts/sequence-draft';
import { FormProblem } from '../form-problem';
import { useActionForm } from '../use-action-form';

export type SubmitRevision = z.infer<typeof submitRevisionSchema>;
const noteSchema = submitRevisionSchema.pick({ note: true });

interface SubmitDialogProps {
  open: boolean;
  onClose: () => void;
  number: number;
  /** The draft as it is saved. */
  revisionId: string;
  version: number;
  /** What differs from the revision in use, a sentence each. */
  changes: readonly string[];
  submit: (input: SubmitRevision) => Promise<Outcome>;
  onSubmitted: () => void;
}

/** Asks for the release of the draft. From then on it is locked until it is released or sent back. */
export function SubmitDialog({
  open,
  onClose,
  number,
  revisionId,
  version,
  changes,
  submit,
  onSubmitted,
}: SubmitDialogProps) {
  const form = useForm({ resolver: zodResolver(noteSchema), defaultValues: { note: '' } });
  const { send, problem, sending } = useActionForm(
    form,
    ({ note }) => submit({ revisionId, version, note }),
    onSubmitted,
  );
  return (
    <Dialog
      open={open}
      onOpenChange={(next) => !next && onClose()}
      title={`Submit r${number} for release?`}
      consequence="Another engineer or quality looks at it and releases it. Until then nobody can change it; it can be sent back to you."
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Submitting' : null}>
            Submit r{number}
          </Button>
          <Button kind="link" onClick={onClose}>
            Go on editing
          </Button>
        </>
      }
    >
      {changes.length > 0 ? (
        <ul className="max-h-[30dvh] list-disc overflow-y-auto pl-5 text-cap" aria-label="What changes">
          {changes.map((change) => (
            <li key={change}>{change}</li>
          ))}
        </ul>
      ) : null}
      <TextAreaField
        {...form.register('note')}
        label="What changed and why"
        hint="Whoever releases it reads this; it stays with the revision."
        error={form.formState.errors.note?.message}
      />
      <FormProblem problem={problem} />
    </Dialog>
  );
}

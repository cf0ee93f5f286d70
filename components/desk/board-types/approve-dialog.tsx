'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { Button } from '@/components/ui/button';
import { ChoiceField } from '@/components/ui/choice-field';
import { Dialog } from '@/components/ui/dialog';
import { approvalMeanings, approveLimitsSchema, type SequenceMisfit } from '@/lib/contracts/board-type-revision';
import type { Outcome } from '@/lib/contracts/outcome';
import type { BoardTypeChange } from '@/lib/board-type/compare-board-types';
import { FormProblem } from '../form-problem';
import { SignatureField } from '../signature-field';
import { useActionForm } from '../use-action-form';
import { ChangeList } from './change-list';
import { Misfits } from './misfits';
import { Misses } from './misses';

interface ApproveDialogProps {
  revisionId: string;
  version: number;
  number: number;
  signer: string;
  note: string;
  changes: readonly BoardTypeChange[];
  misses: readonly string[];
  misfits: readonly SequenceMisfit[];
  onClose: () => void;
  approve: (input: unknown) => Promise<Outcome>;
  onDone: () => void;
}

/** What is signed, what it means, and the password. */
export function ApproveDialog(props: ApproveDialogProps) {
  const { revisionId, version, number, signer, note, changes, misses, misfits, onClose, approve, onDone } = props;
  const form = useForm<z.input<typeof approveLimitsSchema>, unknown, z.infer<typeof approveLimitsSchema>>({
    resolver: zodResolver(approveLimitsSchema),
    defaultValues: { revisionId, version, meaning: 'specification', password: '' },
  });
  const { send, problem, sending } = useActionForm(form, approve, onDone);
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Approve revision ${number}?`}
      consequence="New lots take these limits. Lots that are open keep theirs. Your name, the time and the meaning are kept."
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Signing' : null}>
            Sign and approve
          </Button>
          <Button kind="link" onClick={onClose}>
            Decide later
          </Button>
        </>
      }
    >
      <form noValidate className="grid gap-4" onSubmit={(event) => event.preventDefault()}>
        <blockquote className="border-l-4 border-rule pl-3">{note}</blockquote>
        <ChangeList changes={changes} />
        <Misses misses={misses} ask="The note should say why they stand." />
        <Misfits misfits={misfits} />
        <ChoiceField
          {...form.register('meaning')}
          legend="Your signature means"
          choices={approvalMeanings.map(({ key, words }) => ({ value: key, label: words }))}
        />
        <SignatureField
          {...form.register('password')}
          signer={signer}
          error={form.formState.errors.password?.message}
        />
        <FormProblem problem={problem} />
      </form>
    </Dialog>
  );
}

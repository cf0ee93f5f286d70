'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { TextAreaField } from '@/components/ui/text-area-field';
import type { Outcome } from '@/lib/contracts/outcome';
import { withdrawRevisionSchema, type RevisionHead } from '@/lib/contracts/sequence-draft';
import { FormProblem } from '../form-problem';
import { SignatureField } from '../signature-field';
import { useActionForm } from '../use-action-form';
import { useCountedTries } from './counted-tries';

interface WithdrawDialogProps {
  head: RevisionHead;
  /** Codes of lots not closed that pin it. */
  openLots: readonly string[];
  signer: string;
  onClose: () => void;
  onDone: () => void;
  withdraw: (input: unknown) => Promise<Outcome>;
}

/** Takes a revision out of use for good, signed with a reason. */
export function WithdrawDialog({ head, openLots, signer, onClose, onDone, withdraw }: WithdrawDialogProps) {
  const form = useForm<z.infer<typeof withdrawRevisionSchema>>({
    resolver: zodResolver(withdrawRevisionSchema),
    defaultValues: { revisionId: head.id, reason: '', password: '' },
  });
  const { send, problem, sending } = useActionForm(form, useCountedTries(withdraw), onDone);
  const { errors } = form.formState;
  const lots =
    openLots.length === 0
      ? 'No open lot uses it.'
      : `${openLots.length === 1 ? 'Lot' : 'Lots'} ${openLots.join(', ')} ${openLots.length === 1 ? 'stops' : 'stop'} until moved to another revision.`;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Withdraw r${head.number}?`}
      consequence={`No board is begun with it again; a run under way finishes. ${lots} It cannot be undone, but restored as a new draft.`}
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Signing' : null}>
            Sign and withdraw r{head.number}
          </Button>
          <Button kind="link" onClick={onClose}>
            Keep it
          </Button>
        </>
      }
    >
      <form noValidate className="grid gap-4" onSubmit={(event) => event.preventDefault()}>
        <TextAreaField
          {...form.register('reason')}
          label="Reason"
          hint="Benches show it to whoever scans a board of these lots."
          rows={2}
          error={errors.reason?.message}
        />
        <SignatureField {...form.register('password')} signer={signer} error={errors.password?.message} />
        <FormProblem problem={problem} />
      </form>
    </Dialog>
  );
}

'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import type { ReactNode } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { TextAreaField } from '@/components/ui/text-area-field';
import type { Outcome } from '@/lib/contracts/outcome';
import { FormProblem } from './form-problem';
import { SignatureField } from './signature-field';
import { useActionForm } from './use-action-form';

const plain = z.object({
  reason: z.string().trim().min(1, { error: 'Enter the reason.' }).max(300, { error: 'Use at most 300 characters.' }),
  password: z.string(),
});
const signedToo = plain.extend({ password: z.string().min(1, { error: 'Enter your password.' }) });

interface ReasonDialogProps {
  open: boolean;
  onClose: () => void;
  title: string;
  consequence: ReactNode;
  /** Button that repeats the verb, and the safe one. */
  verb: string;
  keep: string;
  /** Signed with the password as well. */
  signed?: boolean;
  send: (reason: string, password: string) => Promise<Outcome>;
  onDone: () => void;
}

/** Asks for the reason of a change. Focus starts in the reason; a wrong password keeps it. */
export function ReasonDialog({
  open,
  onClose,
  title,
  consequence,
  verb,
  keep,
  signed = false,
  send,
  onDone,
}: ReasonDialogProps) {
  const form = useForm({
    resolver: zodResolver(signed ? signedToo : plain),
    defaultValues: { reason: '', password: '' },
  });
  const { errors } = form.formState;
  const sending = useActionForm(
    form,
    ({ reason, password }) => send(reason, password),
    () => {
      form.reset();
      onDone();
    },
  );
  return (
    <Dialog
      open={open}
      onOpenChange={(next) => !next && onClose()}
      title={title}
      consequence={consequence}
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void sending.send()} pending={sending.sending ? 'Storing' : null}>
            {verb}
          </Button>
          <Button kind="link" onClick={onClose}>
            {keep}
          </Button>
        </>
      }
    >
      <TextAreaField {...form.register('reason')} label="Reason" error={errors.reason?.message} />
      {signed ? <SignatureField {...form.register('password')} error={errors.password?.message} /> : null}
      <FormProblem problem={sending.problem} />
    </Dialog>
  );
}

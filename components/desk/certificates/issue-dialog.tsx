'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import type { Outcome } from '@/lib/contracts/outcome';
import { FormProblem } from '../form-problem';
import { SignatureField } from '../signature-field';
import { useActionForm } from '../use-action-form';

const passwordSchema = z.object({ password: z.string().min(1, { error: 'Enter your password.' }) });

interface IssueDialogProps {
  subject: { unitId: string } | { lotId: string };
  /** "board 00042" or "lot 2648-B". */
  what: string;
  replaces: string | null;
  signer: string;
  issue: (input: unknown) => Promise<Outcome<{ id: string; number: string }>>;
  onClose: () => void;
  onIssued: (number: string) => void;
}

/** Issues a certificate, signed with the password. */
export function IssueDialog({ subject, what, replaces, signer, issue, onClose, onIssued }: IssueDialogProps) {
  const form = useForm({ resolver: zodResolver(passwordSchema), defaultValues: { password: '' } });
  const { send, problem, sending } = useActionForm(
    form,
    ({ password }) => issue({ ...subject, password }),
    ({ number }) => onIssued(number),
  );
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Issue a certificate of ${what}?`}
      consequence={`It states what is on record now and changes no more. ${
        replaces ? `Certificate ${replaces} is then replaced. ` : ''
      }Your name and the time are printed on it.`}
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Making the paper' : null}>
            Sign and issue
          </Button>
          <Button kind="link" onClick={onClose}>
            Issue none
          </Button>
        </>
      }
    >
      <form noValidate className="grid gap-4" onSubmit={(event) => event.preventDefault()}>
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

'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import type { ReactNode } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { SelectField } from '@/components/ui/select-field';
import { TextAreaField } from '@/components/ui/text-area-field';
import type { Outcome } from '@/lib/contracts/outcome';
import { FormProblem } from './form-problem';
import { SignatureField } from './signature-field';
import { useActionForm } from './use-action-form';

const mostCharacters = 300;

/** The reason as it is stored: a word to choose, free words, or both in one sentence. */
const entered = (signed: boolean) =>
  z
    .object({
      word: z.string(),
      reason: z.string().trim(),
      password: signed ? z.string().min(1, { error: 'Enter your password.' }) : z.string(),
    })
    .transform(({ word, reason, password }) => ({ reason: [word, reason].filter(Boolean).join('. '), password }))
    .refine(({ reason }) => reason.length > 0, { error: 'Enter the reason.', path: ['reason'] })
    .refine(({ reason }) => reason.length <= mostCharacters, {
      error: `Use at most ${mostCharacters} characters.`,
      path: ['reason'],
    });
type Entered = z.input<ReturnType<typeof entered>>;
type Given = z.output<ReturnType<typeof entered>>;

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
  /** Reasons to choose from; none: it is given in words. */
  words?: readonly string[];
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
  words = [],
  send,
  onDone,
}: ReasonDialogProps) {
  const form = useForm<Entered, unknown, Given>({
    resolver: zodResolver(entered(signed)),
    defaultValues: { word: '', reason: '', password: '' },
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
      {words.length > 0 ? (
        <SelectField
          {...form.register('word')}
          label="Reason"
          choices={[{ value: '', label: 'in words, below' }, ...words.map((word) => ({ value: word, label: word }))]}
        />
      ) : null}
      <TextAreaField
        {...form.register('reason')}
        label={words.length > 0 ? 'In words' : 'Reason'}
        error={errors.reason?.message}
      />
      {signed ? <SignatureField {...form.register('password')} error={errors.password?.message} /> : null}
      <FormProblem problem={sending.problem} />
    </Dialog>
  );
}

'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch } from 'react-hook-form';
import type { z } from 'zod';
import { Button } from '@/components/ui/button';
import { ChoiceField } from '@/components/ui/choice-field';
import { Dialog } from '@/components/ui/dialog';
import { TextAreaField } from '@/components/ui/text-area-field';
import {
  dispositionSchema,
  retestOrderSchema,
  type DispositionForm,
  type RetestOrderForm,
} from '@/lib/contracts/disposition';
import type { Outcome } from '@/lib/contracts/outcome';
import { FormProblem } from '../form-problem';
import { SignatureField } from '../signature-field';
import { useActionForm } from '../use-action-form';

interface DecisionProps {
  unitId: string;
  serial: string;
  signer: string;
  onClose: () => void;
  onDone: (said: string) => void;
}

type EnteredDisposition = z.input<typeof dispositionSchema>;

/** Rework or scrap, with what was done and why, signed with the password. */
export function DispositionDialog({
  unitId,
  serial,
  signer,
  onClose,
  onDone,
  attemptsUsed,
  sign,
}: DecisionProps & { attemptsUsed: boolean; sign: (input: unknown) => Promise<Outcome> }) {
  const form = useForm<EnteredDisposition, unknown, DispositionForm>({
    resolver: zodResolver(dispositionSchema),
    defaultValues: { unitId, kind: attemptsUsed ? 'scrap' : 'rework', action: '', reason: '', password: '' },
  });
  const kind = useWatch({ control: form.control, name: 'kind' });
  const { send, problem, sending } = useActionForm(form, sign, () =>
    onDone(kind === 'rework' ? `Rework of ${serial} recorded` : `${serial} is scrapped`),
  );
  const { errors } = form.formState;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`What is done with board ${serial.slice(-5)}?`}
      consequence={
        kind === 'rework'
          ? 'It may be tested once more. Your name, the time and the reason are kept.'
          : 'It is never tested again. Your name, the time and the reason are kept.'
      }
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Signing' : null}>
            {kind === 'rework' ? 'Sign the rework' : 'Sign and scrap'}
          </Button>
          <Button kind="link" onClick={onClose}>
            Decide later
          </Button>
        </>
      }
    >
      <form noValidate className="grid gap-4" onSubmit={(event) => event.preventDefault()}>
        <ChoiceField
          {...form.register('kind')}
          legend="Your signature means"
          choices={
            attemptsUsed
              ? [{ value: 'scrap', label: 'scrap it: no attempt is left' }]
              : [
                  { value: 'rework', label: 'reworked, to be tested again' },
                  { value: 'scrap', label: 'scrap it' },
                ]
          }
        />
        {kind === 'rework' ? (
          <TextAreaField {...form.register('action')} label="What was done" rows={2} error={errors.action?.message} />
        ) : null}
        <TextAreaField {...form.register('reason')} label="Reason" rows={2} error={errors.reason?.message} />
        <SignatureField {...form.register('password')} signer={signer} error={errors.password?.message} />
        <FormProblem problem={problem} />
      </form>
    </Dialog>
  );
}

/** Orders one more run of a board that passed or waits, signed with the password. */
export function RetestDialog({
  unitId,
  serial,
  signer,
  onClose,
  onDone,
  order,
}: DecisionProps & { order: (input: unknown) => Promise<Outcome> }) {
  const form = useForm<RetestOrderForm>({
    resolver: zodResolver(retestOrderSchema),
    defaultValues: { unitId, reason: '', password: '' },
  });
  const { send, problem, sending } = useActionForm(form, order, () => onDone(`Retest of ${serial} ordered`));
  const { errors } = form.formState;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Test board ${serial.slice(-5)} again?`}
      consequence="Benches take it once more. The new verdict replaces the one before. Your name, the time and the reason are kept."
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Signing' : null}>
            Sign and order the retest
          </Button>
          <Button kind="link" onClick={onClose}>
            Leave it as it is
          </Button>
        </>
      }
    >
      <form noValidate className="grid gap-4" onSubmit={(event) => event.preventDefault()}>
        <TextAreaField {...form.register('reason')} label="Reason" rows={2} error={errors.reason?.message} />
        <SignatureField {...form.register('password')} signer={signer} error={errors.password?.message} />
        <FormProblem problem={problem} />
      </form>
    </Dialog>
  );
}

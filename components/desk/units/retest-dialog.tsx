'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { TextAreaField } from '@/components/ui/text-area-field';
import { retestOrderSchema, type RetestOrderForm } from '@/lib/contracts/disposition';
import type { Outcome } from '@/lib/contracts/outcome';
import { FormProblem } from '../form-problem';
import { SignatureField } from '../signature-field';
import { useActionForm } from '../use-action-form';

interface RetestDialogProps {
  unitId: string;
  serial: string;
  signer: string;
  onClose: () => void;
  onDone: (said: string) => void;
  order: (input: unknown) => Promise<Outcome>;
}

/** Orders one more run of a board that passed or waits, signed with the password. */
export function RetestDialog({ unitId, serial, signer, onClose, onDone, order }: RetestDialogProps) {
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

'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { FormProblem } from '@/components/desk/form-problem';
import { useActionForm } from '@/components/desk/use-action-form';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { TextField } from '@/components/ui/text-field';
import { useToast } from '@/components/ui/toast';
import { setPinSchema, type SetPinForm } from '@/lib/contracts/people';
import type { Outcome } from '@/lib/contracts/outcome';

interface SetPinButtonProps {
  accountId: string;
  name: string;
  /** Wrong PINs make them wait; a new one ends that. */
  locked: boolean;
  setPin: (input: unknown) => Promise<Outcome>;
}

/** Gives a badge its PIN, written twice. */
export function SetPinButton({ accountId, name, locked, setPin }: SetPinButtonProps) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button kind={locked ? 'filled' : 'outlined'} onClick={() => setOpen(true)}>
        {locked ? 'Unlock and set a new PIN…' : 'Set a PIN…'}
      </Button>
      {open ? <PinDialog accountId={accountId} name={name} setPin={setPin} onClose={() => setOpen(false)} /> : null}
    </>
  );
}

function PinDialog({ accountId, name, setPin, onClose }: Omit<SetPinButtonProps, 'locked'> & { onClose: () => void }) {
  const toast = useToast();
  const form = useForm<SetPinForm>({
    resolver: zodResolver(setPinSchema),
    defaultValues: { accountId, pin: '', again: '' },
  });
  const { send, problem, sending } = useActionForm(form, setPin, () => {
    toast(`${name} has a new PIN`);
    onClose();
  });
  const { errors } = form.formState;
  return (
    <Dialog
      open
      onOpenChange={(next) => !next && onClose()}
      title={`Set a PIN for ${name}?`}
      consequence="The PIN before stops working. Let the person type it where nobody watches."
      focus="first-field"
    >
      <form onSubmit={send} noValidate className="grid gap-4">
        <TextField
          {...form.register('pin')}
          label="PIN, 4 to 8 digits"
          type="password"
          inputMode="numeric"
          autoComplete="off"
          error={errors.pin?.message}
        />
        <TextField
          {...form.register('again')}
          label="PIN again"
          type="password"
          inputMode="numeric"
          autoComplete="off"
          error={errors.again?.message}
        />
        <FormProblem problem={problem} />
        <div className="flex flex-wrap items-center gap-4">
          <Button type="submit" kind="filled" pending={sending ? 'Setting' : null}>
            Set the PIN
          </Button>
          <Button kind="outlined" data-safe onClick={onClose}>
            Leave it as it is
          </Button>
        </div>
      </form>
    </Dialog>
  );
}

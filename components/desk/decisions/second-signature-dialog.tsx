'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { secondSignatureSchema, type SecondSignatureForm } from '@/lib/contracts/disposition';
import type { Outcome } from '@/lib/contracts/outcome';
import type { UnitDisposition } from '@/lib/contracts/unit-page';
import { FormProblem } from '../form-problem';
import { SignatureField } from '../signature-field';
import { useActionForm } from '../use-action-form';
import { DecisionRecord } from './decision-record';

interface SecondSignatureDialogProps {
  serial: string;
  disposition: UnitDisposition;
  signer: string;
  complete: (input: unknown) => Promise<Outcome>;
  onClose: () => void;
  onDone: (said: string) => void;
}

/** Shows exactly what was signed first, and takes the second signature under it. */
export function SecondSignatureDialog(props: SecondSignatureDialogProps) {
  const { serial, disposition, signer, complete, onClose, onDone } = props;
  const form = useForm<SecondSignatureForm>({
    resolver: zodResolver(secondSignatureSchema),
    defaultValues: { dispositionId: disposition.id, digest: disposition.signatures[0]?.digest ?? '', password: '' },
  });
  const { send, problem, sending } = useActionForm(form, complete, () => onDone(`${serial} is used as it is`));
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Use board ${serial.slice(-5)} as it is?`}
      consequence="It leaves the lot as a good board though it was rejected. Your name and the time are kept under this:"
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Signing' : null}>
            Sign the concession
          </Button>
          <Button kind="link" onClick={onClose}>
            Leave it open
          </Button>
        </>
      }
    >
      <div className="border-l-4 border-ink pl-3">
        <DecisionRecord disposition={disposition} />
      </div>
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

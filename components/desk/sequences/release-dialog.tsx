'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { Button } from '@/components/ui/button';
import { ChoiceField } from '@/components/ui/choice-field';
import { Dialog } from '@/components/ui/dialog';
import type { Outcome } from '@/lib/contracts/outcome';
import { releaseMeanings, releaseRevisionSchema, type RevisionHead } from '@/lib/contracts/sequence-draft';
import { FormProblem } from '../form-problem';
import { SignatureField } from '../signature-field';
import { useActionForm } from '../use-action-form';
import { useCountedTries } from './counted-tries';

interface ReleaseDialogProps {
  head: RevisionHead;
  /** The one in use until now. Null: none. */
  inUse: number | null;
  signer: string;
  onClose: () => void;
  onDone: () => void;
  release: (input: unknown) => Promise<Outcome>;
}

/** Signs the release of a revision. Focus starts on the safe choice; Enter never signs. */
export function ReleaseDialog({ head, inUse, signer, onClose, onDone, release }: ReleaseDialogProps) {
  const { id: revisionId, number, version } = head;
  const form = useForm<z.infer<typeof releaseRevisionSchema>>({
    resolver: zodResolver(releaseRevisionSchema),
    defaultValues: { revisionId, version, password: '' },
  });
  const { send, problem, sending } = useActionForm(form, useCountedTries(release), onDone);
  const { errors } = form.formState;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Release r${number}?`}
      consequence={`New lots take r${number} from now on. ${inUse === null ? '' : `Open lots keep r${inUse} until they are moved. `}It cannot be changed afterwards. Your name, the time and the meaning are kept.`}
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Signing' : null}>
            Sign and release r{number}
          </Button>
          <Button kind="link" data-safe onClick={onClose}>
            Not yet
          </Button>
        </>
      }
    >
      <form noValidate className="grid gap-4" onSubmit={(event) => event.preventDefault()}>
        <ChoiceField
          {...form.register('meaning')}
          legend="Your signature means"
          choices={releaseMeanings.map(({ key, words }) => ({ value: key, label: words }))}
        />
        <FormProblem problem={errors.meaning?.message ?? null} />
        <SignatureField {...form.register('password')} signer={signer} error={errors.password?.message} />
        <FormProblem problem={problem} />
      </form>
    </Dialog>
  );
}

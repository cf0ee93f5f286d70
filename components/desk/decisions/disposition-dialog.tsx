'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch } from 'react-hook-form';
import type { z } from 'zod';
import { Button } from '@/components/ui/button';
import { ChoiceField } from '@/components/ui/choice-field';
import { Dialog } from '@/components/ui/dialog';
import { TextAreaField } from '@/components/ui/text-area-field';
import { dispositionSchema, type DecidedBoard, type DispositionForm } from '@/lib/contracts/disposition';
import type { Outcome } from '@/lib/contracts/outcome';
import type { ReasonChoice } from '@/lib/contracts/reason-code';
import type { DispositionKind } from '@/lib/contracts/stored-states';
import { FormProblem } from '../form-problem';
import { SignatureField } from '../signature-field';
import { useActionForm } from '../use-action-form';
import { decisionWords } from './decision-words';
import { ReasonFields } from './reason-fields';

export type SignDispositions = (input: unknown) => Promise<Outcome<{ boards: number }>>;

export interface ChosenBoard extends DecidedBoard {
  serial: string;
}

interface DispositionDialogProps {
  boards: readonly ChosenBoard[];
  /** What may be decided, the first one chosen to begin with. */
  kinds: readonly DispositionKind[];
  reasons: readonly ReasonChoice[];
  signer: string;
  sign: SignDispositions;
  onClose: () => void;
  onDone: (said: string) => void;
}

type Entered = z.input<typeof dispositionSchema>;

/** What is done with one board or many, and why, signed with the password. */
export function DispositionDialog({ boards, kinds, reasons, signer, sign, onClose, onDone }: DispositionDialogProps) {
  const form = useForm<Entered, unknown, DispositionForm>({
    resolver: zodResolver(dispositionSchema),
    defaultValues: {
      boards: boards.map(({ unitId, runId }) => ({ unitId, runId })),
      kind: kinds[0],
      action: '',
      reasonCodeId: '',
      reason: '',
      password: '',
    },
  });
  const kind = useWatch({ control: form.control, name: 'kind' });
  const words = decisionWords[kind];
  const one = boards.length === 1 ? boards[0]! : null;
  const { send, problem, sending } = useActionForm(form, sign, ({ boards: decided }) =>
    onDone(words.done(one ? one.serial : `${decided} boards`)),
  );
  const { errors } = form.formState;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={one ? `What is done with board ${one.serial.slice(-5)}?` : `What is done with ${boards.length} boards?`}
      consequence={`${one ? words.followsOne : words.followsMany} Your name, the time and the reason are kept.`}
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Signing' : null}>
            {words.verb}
          </Button>
          <Button kind="link" onClick={onClose}>
            Decide later
          </Button>
        </>
      }
    >
      <form noValidate className="grid gap-4" onSubmit={(event) => event.preventDefault()}>
        {one ? null : (
          <details>
            <summary className="sw-link w-fit cursor-pointer">The {boards.length} boards</summary>
            <p className="mt-1 max-h-32 overflow-y-auto font-num text-cap" tabIndex={0}>
              {boards.map(({ serial }) => serial).join(', ')}
            </p>
          </details>
        )}
        <ChoiceField
          {...form.register('kind', { onChange: () => form.setValue('reasonCodeId', '') })}
          legend="Your signature means"
          choices={kinds.map((value) => ({ value, label: decisionWords[value].choice }))}
        />
        {kind === 'rework' ? (
          <TextAreaField
            {...form.register('action')}
            label={one ? 'What was done' : 'What was done to each of them'}
            rows={2}
            error={errors.action?.message}
          />
        ) : null}
        <ReasonFields
          use={kind}
          reasons={reasons}
          code={form.register('reasonCodeId')}
          words={form.register('reason')}
          codeError={errors.reasonCodeId?.message}
          wordsError={errors.reason?.message}
        />
        <SignatureField {...form.register('password')} signer={signer} error={errors.password?.message} />
        <FormProblem problem={problem ?? errors.kind?.message ?? errors.boards?.message ?? null} />
      </form>
    </Dialog>
  );
}

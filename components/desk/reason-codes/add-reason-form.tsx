'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { useToast } from '@/components/ui/toast';
import type { Outcome } from '@/lib/contracts/outcome';
import { newReasonCodeSchema, type NewReasonCodeForm } from '@/lib/contracts/reason-code';
import { reasonCodeUses } from '@/lib/contracts/stored-states';
import { FormProblem } from '../form-problem';
import { useActionForm } from '../use-action-form';
import { reasonUseWords } from './reason-use-words';

const uses = reasonCodeUses.map((value) => ({ value, label: reasonUseWords[value] }));

export function AddReasonForm({ add }: { add: (input: unknown) => Promise<Outcome> }) {
  const toast = useToast();
  const form = useForm<NewReasonCodeForm>({
    resolver: zodResolver(newReasonCodeSchema),
    defaultValues: { use: 'rework', word: '' },
  });
  const { send, problem, sending } = useActionForm(form, add, () => {
    toast(`“${form.getValues('word').trim()}” is offered from now on`);
    form.setValue('word', '');
    form.setFocus('word');
  });
  const { errors } = form.formState;
  return (
    <form
      noValidate
      aria-label="Add a reason"
      onSubmit={(event) => {
        event.preventDefault();
        void send();
      }}
    >
      <div className="grid items-start gap-4 md:grid-cols-[220px_minmax(0,420px)_auto]">
        <SelectField {...form.register('use')} label="Reason for" choices={uses} error={errors.use?.message} />
        <TextField {...form.register('word')} label="Reason" autoComplete="off" error={errors.word?.message} />
        <div className="md:pt-[21px]">
          <Button kind="filled" type="submit" pending={sending ? 'Storing' : null}>
            Add
          </Button>
        </div>
      </div>
      <FormProblem problem={problem} />
    </form>
  );
}

'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useRouter } from 'next/navigation';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { Button, ButtonLink } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import type { Outcome } from '@/lib/contracts/outcome';
import { newSequenceSchema } from '@/lib/contracts/sequence-draft';
import { FormProblem } from '../form-problem';
import { useActionForm } from '../use-action-form';

interface NewSequenceFormProps {
  types: readonly { code: string; name: string }[];
  make: (input: unknown) => Promise<Outcome<{ sequenceId: string; revisionId: string }>>;
}

/** A name and a board type; the draft opens with the shortest way to a verdict. */
export function NewSequenceForm({ types, make }: NewSequenceFormProps) {
  const router = useRouter();
  const form = useForm<z.infer<typeof newSequenceSchema>>({
    resolver: zodResolver(newSequenceSchema),
    defaultValues: { boardTypeCode: types[0]?.code ?? '', name: '' },
  });
  const { send, problem, sending } = useActionForm(form, make, ({ sequenceId }) =>
    router.push(`/sequences/${sequenceId}/draft`),
  );
  const { errors } = form.formState;
  return (
    <form onSubmit={send} noValidate className="grid max-w-[560px] gap-5">
      <SelectField
        {...form.register('boardTypeCode')}
        label="Board type"
        choices={types.map(({ code, name }) => ({ value: code, label: `${code}, ${name}` }))}
        error={errors.boardTypeCode?.message}
      />
      <TextField
        {...form.register('name')}
        label="Name"
        autoComplete="off"
        hint="Such as CB1210 cutoff trim. Lots and records show it."
        error={errors.name?.message}
      />
      <FormProblem problem={problem} />
      <div className="flex flex-wrap items-center gap-5">
        <Button type="submit" kind="filled" pending={sending ? 'Making the draft' : null}>
          Make the draft
        </Button>
        <ButtonLink kind="link" href="/sequences">
          Back to the sequences
        </ButtonLink>
      </div>
    </form>
  );
}

'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useRouter } from 'next/navigation';
import { useForm } from 'react-hook-form';
import { Button, ButtonLink } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { newBoardTypeSchema } from '@/lib/contracts/board-type-revision';
import type { Outcome } from '@/lib/contracts/outcome';
import { FormProblem } from '../form-problem';
import { useActionForm } from '../use-action-form';

interface NewBoardTypeFormProps {
  models: { code: string; name: string }[];
  make: (input: unknown) => Promise<Outcome<{ code: string }>>;
}

/** Code, name, and the board type that it is a copy of. */
export function NewBoardTypeForm({ models, make }: NewBoardTypeFormProps) {
  const router = useRouter();
  const form = useForm({
    resolver: zodResolver(newBoardTypeSchema),
    defaultValues: { code: '', name: '', copyOfCode: models[0]?.code ?? '' },
  });
  const { send, problem, sending } = useActionForm(form, make, ({ code }) => router.push(`/board-types/${code}`));
  const { errors } = form.formState;
  return (
    <form noValidate className="grid max-w-xl gap-4" onSubmit={(event) => void send(event)}>
      <TextField
        {...form.register('code')}
        label="Code"
        mono
        hint="3 to 12 capitals and digits. It stays as it is."
        error={errors.code?.message}
      />
      <TextField {...form.register('name')} label="Name" error={errors.name?.message} />
      <SelectField
        {...form.register('copyOfCode')}
        label="Begin from a copy of"
        hint="Circuit, limits and all else are copied; the pictures are not."
        choices={models.map(({ code, name }) => ({ value: code, label: `${code}, ${name}` }))}
        error={errors.copyOfCode?.message}
      />
      <FormProblem problem={problem} />
      <div className="flex flex-wrap gap-4">
        <Button type="submit" kind="filled" pending={sending ? 'Beginning' : null}>
          Begin the board type
        </Button>
        <ButtonLink kind="link" href="/board-types">
          Back to board types
        </ButtonLink>
      </div>
    </form>
  );
}

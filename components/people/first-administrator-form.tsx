'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useRouter } from 'next/navigation';
import { useForm } from 'react-hook-form';
import { FormProblem } from '@/components/desk/form-problem';
import { useActionForm } from '@/components/desk/use-action-form';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/text-field';
import { firstAdministratorSchema, type FirstAdministratorForm as Form } from '@/lib/contracts/people';
import type { Outcome } from '@/lib/contracts/outcome';
import { NewPasswordFields } from './new-password-fields';

interface FirstAdministratorFormProps {
  token: string;
  make: (input: unknown) => Promise<Outcome>;
}

export function FirstAdministratorForm({ token, make }: FirstAdministratorFormProps) {
  const router = useRouter();
  const form = useForm<Form>({
    resolver: zodResolver(firstAdministratorSchema),
    defaultValues: { token, name: '', email: '', password: '', again: '' },
  });
  const { send, problem, sending } = useActionForm(form, make, () => router.replace('/sign-in?because=made'));
  const { errors } = form.formState;
  return (
    <form onSubmit={send} noValidate className="grid gap-5">
      <TextField {...form.register('name')} label="Your name" autoComplete="name" error={errors.name?.message} />
      <TextField
        {...form.register('email')}
        label="E-mail"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
      />
      <NewPasswordFields register={form.register} errors={errors} />
      <FormProblem problem={problem} />
      <div>
        <Button type="submit" kind="filled" pending={sending ? 'Making' : null}>
          Make the account
        </Button>
      </div>
    </form>
  );
}

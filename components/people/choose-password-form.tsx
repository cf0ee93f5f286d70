'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useRouter } from 'next/navigation';
import { useForm } from 'react-hook-form';
import { FormProblem } from '@/components/desk/form-problem';
import { useActionForm } from '@/components/desk/use-action-form';
import { Button } from '@/components/ui/button';
import { choosePasswordSchema, type ChoosePasswordForm as Form } from '@/lib/contracts/people';
import type { Outcome } from '@/lib/contracts/outcome';
import { NewPasswordFields } from './new-password-fields';

interface ChoosePasswordFormProps {
  token: string;
  choose: (input: unknown) => Promise<Outcome>;
}

export function ChoosePasswordForm({ token, choose }: ChoosePasswordFormProps) {
  const router = useRouter();
  const form = useForm<Form>({
    resolver: zodResolver(choosePasswordSchema),
    defaultValues: { token, password: '', again: '' },
  });
  const { send, problem, sending } = useActionForm(form, choose, () => router.replace('/sign-in?because=chosen'));
  return (
    <form onSubmit={send} noValidate className="grid gap-5">
      <NewPasswordFields register={form.register} errors={form.formState.errors} />
      <FormProblem problem={problem} />
      <div>
        <Button type="submit" kind="filled" pending={sending ? 'Saving' : null}>
          Choose this password
        </Button>
      </div>
    </form>
  );
}

'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { signIn } from 'next-auth/react';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { ErrorPanel } from '@/components/ui/error-panel';
import { TextField } from '@/components/ui/text-field';
import { signInSchema, type SignInForm as Form } from '@/lib/contracts/people';
import { signInProblem } from './sign-in-problem';

/** E-mail and password; goes on to `next`, an address of ours. */
export function SignInForm({ next }: { next: string }) {
  const [problem, setProblem] = useState<string | null>(null);
  const { register, handleSubmit, formState, resetField, setFocus } = useForm<Form>({
    resolver: zodResolver(signInSchema),
  });
  const [leaving, setLeaving] = useState(false);
  const send = handleSubmit(async (form) => {
    setProblem(null);
    const result = await signIn('desk', { ...form, redirect: false }).catch(() => undefined);
    if (result?.ok) {
      setLeaving(true);
      window.location.replace(next);
      return;
    }
    setProblem(signInProblem(result?.error ?? null));
    resetField('password');
    setFocus('password');
  });
  return (
    <form onSubmit={send} noValidate className="grid gap-5">
      {problem ? <ErrorPanel title="Not signed in">{problem}</ErrorPanel> : null}
      <TextField
        {...register('email')}
        label="E-mail"
        type="email"
        autoComplete="username"
        autoFocus
        error={formState.errors.email?.message}
      />
      <TextField
        {...register('password')}
        label="Password"
        type="password"
        autoComplete="current-password"
        error={formState.errors.password?.message}
      />
      <div className="flex flex-wrap items-center gap-8">
        <Button type="submit" kind="filled" pending={formState.isSubmitting || leaving ? 'Signing in' : null}>
          Sign in
        </Button>
      </div>
    </form>
  );
}

import type { UseFormRegister } from 'react-hook-form';
import { TextField } from '@/components/ui/text-field';

interface NewPasswordFieldsProps {
  // Any form with `password` and `again`; react-hook-form cannot say "a form that has these fields".
  register: UseFormRegister<any>; // eslint-disable-line @typescript-eslint/no-explicit-any
  errors: { password?: { message?: string }; again?: { message?: string } };
}

/** A new password, written twice. */
export function NewPasswordFields({ register, errors }: NewPasswordFieldsProps) {
  return (
    <>
      <TextField
        {...register('password')}
        label="Password"
        type="password"
        autoComplete="new-password"
        hint="At least 12 characters. A few words in a row do well."
        error={errors.password?.message}
      />
      <TextField
        {...register('again')}
        label="Password again"
        type="password"
        autoComplete="new-password"
        error={errors.again?.message}
      />
    </>
  );
}

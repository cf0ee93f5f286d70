import type { ComponentProps } from 'react';
import { TextField } from '@/components/ui/text-field';

/** Signing: the password once more. Enter does not sign; the button does. */
export function SignatureField({
  signer,
  ...input
}: Omit<ComponentProps<typeof TextField>, 'label'> & { /** Absent: whoever is signed in. */ signer?: string }) {
  return (
    <TextField
      {...input}
      label={signer ? `Password of ${signer}` : 'Your password'}
      type="password"
      autoComplete="current-password"
      onKeyDown={(event) => {
        if (event.key === 'Enter') event.preventDefault();
      }}
    />
  );
}

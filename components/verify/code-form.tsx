'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/text-field';

/** The code of a paper typed by hand, or its whole address. */
export function CodeForm({ error }: { error?: string }) {
  const router = useRouter();
  const [problem, setProblem] = useState(error);
  const check = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const typed = String(new FormData(event.currentTarget).get('code'))
      .trim()
      .replace(/^.*\/verify\//, '');
    if (typed.length !== 22) return setProblem('The code has 22 letters and digits. Compare it with the paper.');
    router.push(`/verify/${encodeURIComponent(typed)}`);
  };
  return (
    <form noValidate onSubmit={check} className="grid gap-4">
      <TextField
        name="code"
        label="Code at the end of the address at the foot of the paper"
        mono
        autoComplete="off"
        autoCapitalize="none"
        spellCheck={false}
        error={problem}
      />
      <Button kind="filled" type="submit">
        Check this code
      </Button>
    </form>
  );
}

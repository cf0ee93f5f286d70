'use client';

import { useState } from 'react';
import { FormProblem } from '@/components/desk/form-problem';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import type { Outcome } from '@/lib/contracts/outcome';

interface PasswordLinkButtonProps {
  accountId: string;
  name: string;
  make: (input: unknown) => Promise<Outcome<{ link: string; hours: number }>>;
}

/** Makes a link by which the person chooses a password; shown once, to be handed over. */
export function PasswordLinkButton({ accountId, name, make }: PasswordLinkButtonProps) {
  const [made, setMade] = useState<{ link: string; hours: number } | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const [copied, setCopied] = useState(false);

  async function ask(): Promise<void> {
    setBusy(true);
    setProblem(null);
    setCopied(false);
    const outcome = await make({ accountId }).catch(() => null);
    setBusy(false);
    if (outcome?.ok) setMade(outcome.value);
    else setProblem(outcome?.sentence ?? 'The server did not answer. Try again.');
  }

  return (
    <>
      <Button onClick={() => void ask()} pending={busy ? 'Making the link' : null}>
        Link for a new password
      </Button>
      <FormProblem problem={problem} />
      <Dialog
        open={made !== null}
        onOpenChange={(open) => !open && setMade(null)}
        title={`Give this link to ${name}`}
        consequence={`It works once, within ${made?.hours} hours, and is not shown again. Links made before no longer work.`}
        actions={
          <>
            <Button
              kind="filled"
              onClick={() => void navigator.clipboard.writeText(made?.link ?? '').then(() => setCopied(true))}
            >
              {copied ? 'Copied' : 'Copy the link'}
            </Button>
            <Button data-safe onClick={() => setMade(null)}>
              Close
            </Button>
          </>
        }
      >
        <output className="block break-all bg-paper p-2.5 font-num text-cap">{made?.link}</output>
      </Dialog>
    </>
  );
}

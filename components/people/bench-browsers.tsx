'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { FormProblem } from '@/components/desk/form-problem';
import { Button, ButtonLink } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { useToast } from '@/components/ui/toast';
import type { Outcome } from '@/lib/contracts/outcome';

interface BenchBrowsersProps {
  code: string;
  enrolled: number;
  enrolHere: (input: unknown) => Promise<Outcome>;
  revokeAll: (input: unknown) => Promise<Outcome<{ revoked: number }>>;
}

/** Which browsers are this station's bench: enrols the one that shows this page, or ends all enrolments. */
export function BenchBrowsers({ code, enrolled, enrolHere, revokeAll }: BenchBrowsersProps) {
  const router = useRouter();
  const toast = useToast();
  const [asking, setAsking] = useState<'enrol' | 'revoke' | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);

  async function act<Value>(action: (input: unknown) => Promise<Outcome<Value>>, done: string): Promise<boolean> {
    setBusy(true);
    const outcome = await action({ code }).catch(() => null);
    setBusy(false);
    setAsking(null);
    setProblem(outcome?.ok ? null : (outcome?.sentence ?? 'The server did not answer. Try again.'));
    if (!outcome?.ok) return false;
    toast(done);
    router.refresh();
    return true;
  }

  return (
    <>
      <p className="mb-3">
        {enrolled === 0
          ? 'No browser is enrolled: nobody can sign in at this bench.'
          : `${enrolled} ${enrolled === 1 ? 'browser is' : 'browsers are'} enrolled at this bench.`}
      </p>
      <div className="flex flex-wrap items-center gap-4">
        <Button onClick={() => setAsking('enrol')}>Enrol this browser…</Button>
        <Button unavailable={enrolled === 0 ? 'none is enrolled' : null} onClick={() => setAsking('revoke')}>
          End all enrolments…
        </Button>
        <ButtonLink kind="link" href={`/bench/${code}`}>
          Open the bench screen
        </ButtonLink>
      </div>
      <FormProblem problem={problem} />
      <Dialog
        open={asking === 'enrol'}
        onOpenChange={(open) => !open && setAsking(null)}
        title={`Make this browser the bench of ${code}?`}
        consequence="Do this on the computer that stands at the station. Anyone at this browser can then sign in there with badge and PIN. Sign out of the desk afterwards."
        actions={
          <>
            <Button
              kind="filled"
              pending={busy ? 'Enrolling' : null}
              onClick={() => void act(enrolHere, `This browser is now the bench of ${code}`)}
            >
              Enrol this browser
            </Button>
            <Button data-safe onClick={() => setAsking(null)}>
              Leave it as it is
            </Button>
          </>
        }
      />
      <Dialog
        open={asking === 'revoke'}
        onOpenChange={(open) => !open && setAsking(null)}
        title={`End all enrolments of ${code}?`}
        consequence="Its screens close within seconds. A run in progress ends without a verdict and the supply goes off."
        actions={
          <>
            <Button
              kind="filled"
              pending={busy ? 'Ending' : null}
              onClick={() => void act(revokeAll, `No browser is the bench of ${code} any more`)}
            >
              End all enrolments
            </Button>
            <Button data-safe onClick={() => setAsking(null)}>
              Leave them
            </Button>
          </>
        }
      />
    </>
  );
}

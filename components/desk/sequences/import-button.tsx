'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { useToast } from '@/components/ui/toast';
import type { Outcome } from '@/lib/contracts/outcome';
import type { ImportedSequence } from '@/lib/contracts/sequence-draft';
import type { FileProblem } from '@/lib/sequence/sequence-file';
import { FileDrop } from '../file-drop';
import { FormProblem } from '../form-problem';
import { FileProblems } from './file-problems';

interface ImportButtonProps {
  /** Null: into the sequence that the file names. */
  sequenceId: string | null;
  send: (input: unknown) => Promise<Outcome<ImportedSequence>>;
  /** Why nothing can be imported now. */
  unavailable?: string | null;
}

const unreachable = 'The server did not answer. Nothing was stored. Choose the file again.';

/** Takes a sequence from a file as a draft. A bad file is answered with every problem and its line. */
export function ImportButton({ sequenceId, send, unavailable = null }: ImportButtonProps) {
  const router = useRouter();
  const toast = useToast();
  const [open, setOpen] = useState(false);
  const [chosen, setChosen] = useState<string | null>(null);
  const [problems, setProblems] = useState<readonly FileProblem[]>([]);
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);

  async function take(name: string, text: string): Promise<void> {
    setChosen(name);
    setProblems([]);
    setProblem(null);
    setBusy(true);
    const outcome = await send({ text, sequenceId }).catch(() => null);
    setBusy(false);
    if (!outcome?.ok) return setProblem(outcome?.sentence ?? unreachable);
    if (!outcome.value.made) return setProblems(outcome.value.problems);
    toast(`${name} is the draft r${outcome.value.number} now`);
    setOpen(false);
    router.push(`/sequences/${outcome.value.sequenceId}/draft`);
  }

  return (
    <>
      <Button onClick={() => setOpen(true)} unavailable={unavailable}>
        Import a file…
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title="Which sequence is imported?"
        consequence="It becomes a draft. Nothing is released, and no station runs it."
        actions={
          <Button kind="link" data-safe onClick={() => setOpen(false)}>
            Import nothing
          </Button>
        }
      >
        <FileDrop
          label={busy ? 'Reading' : 'Choose a file'}
          kinds="JSON written by an export of a sequence, at most 500 kB"
          accept=".json,application/json"
          mostBytes={500_000}
          chosen={chosen}
          onText={(name, text) => void take(name, text)}
        />
        <FormProblem problem={problem} />
        {problems.length > 0 ? <FileProblems problems={problems} /> : null}
        <p className="text-cap text-ink-2">
          <a className="sw-link" href="/api/sequences/schema">
            The schema of these files
          </a>
        </p>
      </Dialog>
    </>
  );
}

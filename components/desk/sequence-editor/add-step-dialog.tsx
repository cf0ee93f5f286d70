'use client';

import { useId, useState, type KeyboardEvent } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { TextField } from '@/components/ui/text-field';
import type { StepKind } from '@/lib/sequence/step';
import { stepKinds } from '@/lib/steps/step-kinds';

interface AddStepDialogProps {
  open: boolean;
  onClose: () => void;
  /** "after step 3, Find points". */
  where: string;
  onAdd: (kind: StepKind) => void;
}

/** Every kind of step with its purpose; typing narrows the list, arrows choose, Enter adds. */
export function AddStepDialog({ open, onClose, where, onAdd }: AddStepDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={(next) => !next && onClose()}
      title="Which step to add?"
      consequence={`It goes ${where}, with values that suit the board type.`}
      focus="first-field"
      actions={
        <Button kind="link" onClick={onClose}>
          Add none
        </Button>
      }
    >
      <KindList onAdd={onAdd} />
    </Dialog>
  );
}

function KindList({ onAdd }: { onAdd: (kind: StepKind) => void }) {
  const id = useId();
  const [typed, setTyped] = useState('');
  const [at, setAt] = useState(0);
  const words = typed.toLowerCase().split(/\s+/);
  const kinds = stepKinds.filter(({ word, purpose }) => {
    const text = `${word} ${purpose}`.toLowerCase();
    return words.every((each) => text.includes(each));
  });
  const chosen = kinds[Math.min(at, kinds.length - 1)];

  function walk(event: KeyboardEvent) {
    const to = { ArrowDown: at + 1, ArrowUp: at - 1, Home: 0, End: kinds.length - 1 }[event.key];
    if (event.key === 'Enter' && chosen) {
      event.preventDefault();
      return onAdd(chosen.kind);
    }
    if (to === undefined || kinds.length === 0) return;
    event.preventDefault();
    const next = (to + kinds.length) % kinds.length;
    setAt(next);
    document.getElementById(`${id}-${kinds[next]!.kind}`)?.scrollIntoView({ block: 'nearest' });
  }

  return (
    <>
      <TextField
        label="Find a kind"
        role="combobox"
        aria-expanded
        aria-controls={`${id}-list`}
        aria-activedescendant={chosen ? `${id}-${chosen.kind}` : undefined}
        autoComplete="off"
        value={typed}
        onChange={({ target }) => {
          setTyped(target.value);
          setAt(0);
        }}
        onKeyDown={walk}
      />
      <ul
        id={`${id}-list`}
        role="listbox"
        aria-label="Kinds of step"
        tabIndex={-1}
        className="max-h-[46dvh] overflow-y-auto border-y-2 border-ink"
      >
        {kinds.map((kind) => (
          <li
            key={kind.kind}
            id={`${id}-${kind.kind}`}
            role="option"
            aria-selected={kind === chosen}
            onClick={() => onAdd(kind.kind)}
            className={`cursor-pointer border-b border-hair px-3 py-1.5 ${kind === chosen ? 'bg-accent text-on-accent' : 'hover:bg-accent-wash'}`}
          >
            <b>{kind.word}</b>
            <span className={`block text-cap ${kind === chosen ? '' : 'text-ink-2'}`}>{kind.purpose}</span>
          </li>
        ))}
      </ul>
      <p role="status" className={kinds.length === 0 ? '' : 'sr-only'}>
        {kinds.length === 0 ? 'No kind of step has these words.' : `${kinds.length} kinds`}
      </p>
    </>
  );
}

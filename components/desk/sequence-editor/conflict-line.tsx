'use client';

import { VerdictMark } from '@/components/ui/verdict-mark';
import { chooseConflict } from '@/lib/sequence/choose-conflict';
import { blankKey, type Conflict, type Draft } from '@/lib/sequence/draft';
import { fieldValue } from '@/lib/sequence/field-value';
import { ruleWords, stepWord, valueWords } from '@/lib/sequence/value-words';
import type { SentenceField } from '@/lib/steps/step-kind';
import { kindOf } from '@/lib/steps/step-kinds';
import { useEditor } from './editor-context';

/** What both changed: said, with both to choose from. Mine stands until one is chosen. */
export function ConflictLine({ conflict }: { conflict: Conflict }) {
  const { draft, edit, locked } = useEditor();
  const { said, mine, theirs } = wordsOf(conflict, draft);
  const choose = (choice: 'mine' | 'theirs') => edit((now) => chooseConflict(now, conflict, choice));
  return (
    <div className="flex flex-wrap items-baseline gap-x-3 gap-y-1 border-l-4 border-accent bg-accent-wash px-2 py-1 text-cap">
      <VerdictMark shape="check" size={14} />
      <span>{said}</span>
      {locked
        ? null
        : (
            [
              ['mine', mine],
              ['theirs', theirs],
            ] as const
          ).map(([choice, words]) => (
            <button
              key={choice}
              type="button"
              onClick={() => choose(choice)}
              className="min-h-[25px] font-bold text-accent underline decoration-2 underline-offset-4 hover:bg-sheet max-sm:min-h-[46px]"
            >
              {words}
            </button>
          ))}
    </div>
  );
}

function wordsOf(conflict: Conflict, draft: Draft): { said: string; mine: string; theirs: string } {
  const { by } = conflict;
  const { steps, decisionRule } = draft.sequence;
  switch (conflict.kind) {
    case 'value': {
      const step = steps.find(({ id }) => id === conflict.stepId)!;
      const blank = blankOf(step, conflict.field);
      const words = (value: unknown) => valueWords(value, blank, steps);
      const own = draft.unread[blankKey(step.id, conflict.field)];
      const mine = own === undefined ? words(fieldValue(step, conflict.field)) : `“${own}”`;
      const theirs = words(conflict.theirs);
      return { said: `${blank.label}: ${by} saved ${theirs}.`, mine: `Keep ${mine}`, theirs: `Use ${theirs}` };
    }
    case 'removed-there':
      return { said: `${by} removed this step.`, mine: 'Keep it', theirs: 'Remove it' };
    case 'removed-here':
      return { said: `You removed this step, ${by} changed it.`, mine: 'Remove it', theirs: 'Keep it' };
    case 'step':
      return {
        said: `${by} made another step of it: ${stepWord(conflict.theirs)}.`,
        mine: 'Keep this one',
        theirs: `Use ${stepWord(conflict.theirs)}`,
      };
    case 'place': {
      const after = steps.findIndex(({ id }) => id === conflict.after);
      const where = after < 0 ? 'at the beginning' : `after step ${after + 1}, ${stepWord(steps[after]!)}`;
      return { said: `${by} put this step ${where}.`, mine: 'Keep it here', theirs: `Put it ${where}` };
    }
    case 'rule': {
      const [mine, theirs] = [ruleWords(decisionRule), ruleWords(conflict.theirs)];
      return { said: `${by} saved ${theirs}.`, mine: `Keep ${mine}`, theirs: `Use ${theirs}` };
    }
    case 'reason':
      return {
        said: `${by} ${conflict.theirs ? `wrote: “${conflict.theirs}”` : 'removed the reason'}.`,
        mine: 'Keep mine',
        theirs: conflict.theirs ? 'Use theirs' : 'Remove it',
      };
  }
}

const common: Record<string, SentenceField> = {
  name: { field: 'name', label: 'Name', input: 'text' },
  enabled: { field: 'enabled', label: 'Switch', input: 'switch' },
};

function blankOf(step: Draft['sequence']['steps'][number], field: string): SentenceField {
  const blanks = kindOf(step).sentence(step);
  const found = blanks.find((part): part is SentenceField => typeof part !== 'string' && part.field === field);
  return found ?? common[field] ?? { field, label: field, input: 'text' };
}

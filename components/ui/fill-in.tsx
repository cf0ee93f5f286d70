import type { ComponentProps } from 'react';
import { ChoiceArrow } from './choice-arrow';
import type { Choice } from './select-field';

const look =
  'min-h-[30px] border-0 border-b-2 border-rule bg-sheet px-2 text-body font-bold text-ink hover:border-accent max-sm:min-h-[46px]';

/** A gap in a sentence to write in. `label` is read aloud. */
export function FillIn({ label, className = '', ...input }: ComponentProps<'input'> & { label: string }) {
  return <input {...input} aria-label={label} className={`${look} ${className}`} />;
}

type FillInChoiceProps = ComponentProps<'select'> & { label: string; choices: readonly Choice[] };

/** A gap in a sentence to choose for. */
export function FillInChoice({ label, choices, className = '', ...select }: FillInChoiceProps) {
  return (
    <span className="relative inline-block">
      <select {...select} aria-label={label} className={`${look} appearance-none pr-7 ${className}`}>
        {choices.map((choice) => (
          <option key={choice.value} value={choice.value}>
            {choice.label}
          </option>
        ))}
      </select>
      <ChoiceArrow />
    </span>
  );
}

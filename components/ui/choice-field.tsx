import { useId, type ComponentProps } from 'react';
import type { Choice } from './select-field';

type ChoiceFieldProps = Omit<ComponentProps<'input'>, 'id' | 'type' | 'value'> & {
  legend: string;
  choices: readonly Choice[];
};

/** Diamonds: one of a few, all in sight. */
export function ChoiceField({ legend, choices, defaultValue, ...input }: ChoiceFieldProps) {
  const id = useId();
  return (
    <fieldset className="grid gap-1">
      <legend className="text-cap">{legend}</legend>
      {choices.map((choice) => (
        <div key={choice.value} className="flex min-h-8 items-center gap-3 max-sm:min-h-[46px]">
          <input
            {...input}
            id={`${id}-${choice.value}`}
            type="radio"
            value={choice.value}
            defaultChecked={defaultValue === undefined ? undefined : defaultValue === choice.value}
            className="peer size-3.5 flex-none rotate-45 appearance-none border-2 border-accent bg-sheet checked:bg-accent checked:shadow-[inset_0_0_0_2px_var(--sw-sheet)]"
          />
          <label htmlFor={`${id}-${choice.value}`} className="peer-checked:font-bold">
            {choice.label}
          </label>
        </div>
      ))}
    </fieldset>
  );
}

'use client';

import { ChoiceField } from '@/components/ui/choice-field';
import type { Choice } from '@/components/ui/select-field';
import { useBoardTypeForm } from './form-context';

interface ChoiceLineProps<V extends string> {
  legend: string;
  name: string;
  value: V;
  choices: readonly (Choice & { value: V })[];
  onChoose: (value: V) => void;
}

/** Diamonds while it can be changed, a sentence when it can only be read. */
export function ChoiceLine<V extends string>({ legend, name, value, choices, onChoose }: ChoiceLineProps<V>) {
  const { readOnly } = useBoardTypeForm();
  if (readOnly)
    return (
      <p>
        <span className="block text-cap">{legend}</span>
        <b>{choices.find((choice) => choice.value === value)?.label}</b>
      </p>
    );
  return (
    // Another value from elsewhere, such as Undo, shows at once.
    <ChoiceField
      key={value}
      legend={legend}
      name={name}
      choices={choices}
      defaultValue={value}
      onChange={(event) => onChoose(event.target.value as V)}
    />
  );
}

import { useId, type ComponentProps } from 'react';
import { ChoiceArrow } from './choice-arrow';
import { Field, fieldControl, type FieldMessages } from './field';

export interface Choice {
  value: string;
  label: string;
}

type SelectFieldProps = FieldMessages & Omit<ComponentProps<'select'>, 'id'> & { choices: readonly Choice[] };

/** One of a few; the browser's own list, so that it works by touch, key and reader. */
export function SelectField({ label, hint, error, warning, choices, ...select }: SelectFieldProps) {
  const id = useId();
  const messages = { label, hint, error, warning };
  const control = fieldControl(id, messages);
  return (
    <Field id={id} messages={messages}>
      <span className="relative block">
        <select {...select} {...control} className={`${control.className} appearance-none pr-8`}>
          {choices.map((choice) => (
            <option key={choice.value} value={choice.value}>
              {choice.label}
            </option>
          ))}
        </select>
        <ChoiceArrow />
      </span>
    </Field>
  );
}

import { useId, type ComponentProps } from 'react';
import { Field, fieldControl, type FieldMessages } from './field';

type TextFieldProps = FieldMessages & Omit<ComponentProps<'input'>, 'id'> & { unit?: string; mono?: boolean };

/** One line of text, 38 px high; `unit` stands inside at the right. Takes what `register()` of react-hook-form gives. */
export function TextField({ label, hint, error, warning, unit, mono = false, ...input }: TextFieldProps) {
  const id = useId();
  const messages = { label, hint, error, warning };
  const control = fieldControl(id, messages);
  return (
    <Field id={id} messages={messages}>
      <span className="relative block">
        <input
          {...input}
          {...control}
          className={`${control.className} ${mono ? 'font-num' : ''} ${unit ? 'pr-14' : ''} ${input.className ?? ''}`}
        />
        {unit ? (
          <span className="pointer-events-none absolute inset-y-0 right-2.5 flex items-center text-ink-2">{unit}</span>
        ) : null}
      </span>
    </Field>
  );
}

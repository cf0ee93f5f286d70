import { useId, type ComponentProps } from 'react';
import { Field, fieldControl, type FieldMessages } from './field';

type TextAreaFieldProps = FieldMessages & Omit<ComponentProps<'textarea'>, 'id'>;

/** Several lines of text, such as a reason or pasted serial numbers. */
export function TextAreaField({ label, hint, error, warning, ...area }: TextAreaFieldProps) {
  const id = useId();
  const messages = { label, hint, error, warning };
  const control = fieldControl(id, messages);
  return (
    <Field id={id} messages={messages}>
      <textarea rows={3} {...area} {...control} className={`${control.className} py-2 ${area.className ?? ''}`} />
    </Field>
  );
}

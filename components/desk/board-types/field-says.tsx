'use client';

import { VerdictMark } from '@/components/ui/verdict-mark';
import { fieldId, focusField, useBoardTypeForm } from './form-context';

/**
 * What is wrong with a field, under it; nothing while all is well. `names` puts the field's name in front, as a way to it: such a
 * line repeats the one at the field.
 */
export function FieldSays({ path, names }: { path: string; names?: string }) {
  const { sentenceOf } = useBoardTypeForm();
  const wrong = sentenceOf(path);
  if (!wrong) return null;
  const error = wrong.severity === 'error';
  return (
    <p
      id={names ? undefined : `${fieldId(path)}-says`}
      className={`flex items-start gap-1.5 text-cap ${error ? 'font-bold text-reject' : 'text-ink-2'}`}
    >
      <VerdictMark shape={error ? 'reject' : 'check'} size={13} />
      <span>
        {names ? (
          <button type="button" className="sw-link mr-1.5" onClick={() => focusField(path)}>
            {names}
          </button>
        ) : null}
        {wrong.sentence}
      </span>
    </p>
  );
}

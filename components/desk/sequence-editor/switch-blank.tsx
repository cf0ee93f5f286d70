'use client';

import { fieldValue } from '@/lib/sequence/field-value';
import { setField } from '@/lib/sequence/draft-edits';
import { blankId } from './blank-ids';
import type { BlankProps } from './blank';
import { useEditor } from './editor-context';
import { Switch } from './switch';

export function SwitchBlank({ step, blank }: BlankProps) {
  const { edit } = useEditor();
  return (
    <Switch
      id={blankId(step.id, blank.field)}
      label={blank.label}
      on={fieldValue(step, blank.field) === true}
      onChange={(value) => edit((draft) => setField(draft, { stepId: step.id, field: blank.field, value }))}
    />
  );
}

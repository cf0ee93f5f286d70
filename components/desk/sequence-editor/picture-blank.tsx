'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { fieldValue } from '@/lib/sequence/field-value';
import { setField } from '@/lib/sequence/draft-edits';
import { PictureField } from '../files/picture-field';
import { blankFrame } from './blank-look';
import { blankId } from './blank-ids';
import { useBlankState, type BlankProps } from './blank';
import { useEditor } from './editor-context';

/** Opens a sheet in which the picture of an instruction is looked at, chosen or removed. */
export function PictureBlank({ step, blank }: BlankProps) {
  const { edit } = useEditor();
  const state = useBlankState({ step, blank });
  const [open, setOpen] = useState(false);
  const value = fieldValue(step, blank.field);
  const fileId = typeof value === 'string' ? value : null;
  return (
    <>
      <button
        id={blankId(step.id, blank.field)}
        type="button"
        data-blank=""
        aria-describedby={state.describedBy}
        onClick={() => setOpen(true)}
        className={`font-bold text-accent underline underline-offset-4 ${blankFrame(state)}`}
      >
        {fileId ? 'this picture' : (blank.whenNull ?? 'no picture')}
      </button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title="Picture of the instruction"
        consequence="The bench shows it beside the words."
        actions={
          <Button kind="filled" data-safe="" onClick={() => setOpen(false)}>
            Close
          </Button>
        }
      >
        <PictureField
          kind="instruction-picture"
          label={blank.label}
          fileId={fileId}
          onChange={(id) => edit((draft) => setField(draft, { stepId: step.id, field: blank.field, value: id }))}
        />
      </Dialog>
    </>
  );
}

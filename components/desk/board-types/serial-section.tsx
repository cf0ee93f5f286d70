'use client';

import { useState } from 'react';
import { Section } from '@/components/ui/page-head';
import { TextField } from '@/components/ui/text-field';
import { VerdictMark } from '@/components/ui/verdict-mark';
import { mostAttemptsField } from '@/lib/board-type/fields';
import { readSerialPattern } from '@/lib/board-type/serial-pattern';
import { useBoardTypeForm } from './form-context';
import { QuantityRow } from './quantity-row';

/** A field that can only be read has no frame. */
const plain = 'border-transparent! bg-transparent! px-0!';

/** The name, the pattern of serial numbers with what it matches in words, and a serial to try it on. */
export function SerialSection() {
  const { form, readOnly, sentenceOf, change } = useBoardTypeForm();
  const [tried, setTried] = useState('');
  const pattern = readSerialPattern(form.serialPattern);
  const wrong = (path: string) => {
    const said = sentenceOf(path);
    return {
      error: said?.severity === 'error' ? said.sentence : null,
      warning: said?.severity === 'warning' ? said.sentence : null,
    };
  };
  return (
    <Section title="Name, serial numbers and attempts">
      <div className="grid max-w-2xl gap-4">
        <TextField
          label="Name"
          value={form.name}
          readOnly={readOnly}
          className={readOnly ? plain : ''}
          onChange={(event) => change({ name: event.target.value })}
          {...wrong('name')}
        />
        <TextField
          label="Pattern of a serial number"
          mono
          value={form.serialPattern}
          readOnly={readOnly}
          className={readOnly ? plain : ''}
          onChange={(event) => change({ serialPattern: event.target.value })}
          hint={pattern.ok ? `${pattern.words}, such as ${pattern.example}.` : undefined}
          {...wrong('serialPattern')}
        />
        <TextField
          label="Try a serial number"
          mono
          value={tried}
          onChange={(event) => setTried(event.target.value)}
          hint={pattern.ok && tried ? <Tried matches={pattern.expression.test(tried.trim())} /> : 'It is not stored.'}
        />
        <QuantityRow name="A board may be tested" fields={[mostAttemptsField]} />
      </div>
    </Section>
  );
}

function Tried({ matches }: { matches: boolean }) {
  return (
    <>
      <VerdictMark shape={matches ? 'pass' : 'reject'} size={13} />{' '}
      {matches ? 'This is a serial of this board type.' : 'This is none of this board type.'}
    </>
  );
}

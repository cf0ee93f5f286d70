'use client';

import { useId, useState, type DragEvent } from 'react';
import { buttonClass } from '@/components/ui/button-style';
import { VerdictMark } from '@/components/ui/verdict-mark';

interface FileDropProps {
  /** Such as "Choose a file". */
  label: string;
  /** Such as "CSV or text, at most 500 kB". */
  kinds: string;
  accept: string;
  mostBytes: number;
  /** Name of the file that is chosen now. */
  chosen: string | null;
  onText: (name: string, text: string) => void;
}

/** A dashed blue frame with a button; a file can also be dropped on it. Refusals name the file. */
export function FileDrop({ label, kinds, accept, mostBytes, chosen, onText }: FileDropProps) {
  const id = useId();
  const [problem, setProblem] = useState<string | null>(null);
  async function take(file: File | undefined): Promise<void> {
    if (!file) return;
    setProblem(null);
    if (file.size > mostBytes) return setProblem(`${file.name} is too large. ${kinds}.`);
    const text = await file.text().catch(() => null);
    if (text === null) return setProblem(`${file.name} could not be read. Choose it again.`);
    if (text.includes('\u0000')) return setProblem(`${file.name} is not a text file. Save it as CSV first.`);
    onText(file.name, text);
  }
  const onDrop = (event: DragEvent) => {
    event.preventDefault();
    void take(event.dataTransfer.files[0]);
  };
  return (
    <div className="grid gap-1.5">
      <div
        onDragOver={(event) => event.preventDefault()}
        onDrop={onDrop}
        className="flex flex-wrap items-center gap-x-5 gap-y-2 border-2 border-dashed border-accent px-4 py-4"
      >
        <label
          htmlFor={id}
          className={`${buttonClass('outlined')} cursor-pointer focus-within:outline-3 focus-within:outline-ink`}
        >
          {label}
          <input
            id={id}
            type="file"
            accept={accept}
            aria-describedby={`${id}-kinds`}
            className="sw-only-read"
            onChange={(event) => {
              void take(event.target.files?.[0]);
              // The same file can be chosen again after it was corrected.
              event.target.value = '';
            }}
          />
        </label>
        <span>
          {chosen ? <b>{chosen}</b> : 'or drop it here.'}
          <span id={`${id}-kinds`} className="block text-cap text-ink-2">
            {kinds}
          </span>
        </span>
      </div>
      {problem ? (
        <p role="alert" className="flex items-start gap-1.5 text-cap font-bold text-reject">
          <VerdictMark shape="reject" size={13} />
          <span>{problem}</span>
        </p>
      ) : null}
    </div>
  );
}

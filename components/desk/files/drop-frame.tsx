'use client';

import { useId, type DragEvent, type ReactNode } from 'react';
import { buttonClass } from '@/components/ui/button-style';
import { VerdictMark } from '@/components/ui/verdict-mark';

interface DropFrameProps {
  /** Such as "Choose a file". */
  label: string;
  /** Such as "CSV or text, at most 500 kB". */
  kinds: string;
  accept: string;
  /** Name of the file that is chosen now. */
  chosen: string | null;
  problem: string | null;
  onFile: (file: File) => void;
  /** Below the button, such as the progress. */
  children?: ReactNode;
}

/** A dashed blue frame with a button; a file can also be dropped on it. */
export function DropFrame({ label, kinds, accept, chosen, problem, onFile, children }: DropFrameProps) {
  const id = useId();
  const take = (file: File | undefined) => file && onFile(file);
  const onDrop = (event: DragEvent) => {
    event.preventDefault();
    take(event.dataTransfer.files[0]);
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
              take(event.target.files?.[0]);
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
        {children}
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

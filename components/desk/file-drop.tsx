'use client';

import { useState } from 'react';
import { DropFrame } from './files/drop-frame';

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

/** Takes a text file, read in the browser. Refusals name the file. */
export function FileDrop({ kinds, mostBytes, onText, ...frame }: FileDropProps) {
  const [problem, setProblem] = useState<string | null>(null);
  async function take(file: File): Promise<void> {
    setProblem(null);
    if (file.size > mostBytes) return setProblem(`${file.name} is too large. ${kinds}.`);
    const text = await file.text().catch(() => null);
    if (text === null) return setProblem(`${file.name} could not be read. Choose it again.`);
    if (text.includes('\u0000')) return setProblem(`${file.name} is not a text file. Save it as CSV first.`);
    onText(file.name, text);
  }
  return <DropFrame {...frame} kinds={kinds} problem={problem} onFile={(file) => void take(file)} />;
}

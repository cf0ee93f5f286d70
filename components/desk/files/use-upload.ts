'use client';

import { useEffect, useRef, useState } from 'react';
import type { FileFacts } from '@/lib/contracts/file-upload';
import type { Outcome } from '@/lib/contracts/outcome';
import type { FileKind } from '@/lib/contracts/stored-states';
import { fileRules, mostFileBytes } from '@/lib/files/file-rules';

export interface UploadProgress {
  name: string;
  sentBytes: number;
  bytes: number;
  /** Null until enough was sent to tell. */
  secondsLeft: number | null;
}

const silent = 'The server did not answer. The file was not stored. Try again.';

/** Sends a file to be stored, with its progress. `problem` is the sentence that refused the last one. */
export function useUpload(kind: FileKind, onStored: (file: FileFacts) => void) {
  const [progress, setProgress] = useState<UploadProgress | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const running = useRef<XMLHttpRequest | null>(null);
  useEffect(() => () => running.current?.abort(), []);

  function end(sentence: string | null): void {
    running.current = null;
    setProgress(null);
    setProblem(sentence);
  }

  function send(file: File): void {
    if (file.size > mostFileBytes) return setProblem(`${file.name} is too large. Use ${fileRules[kind].words}.`);
    running.current?.abort();
    // XMLHttpRequest, since fetch does not tell how much was sent.
    const request = new XMLHttpRequest();
    running.current = request;
    const startedMs = performance.now();
    setProblem(null);
    setProgress({ name: file.name, sentBytes: 0, bytes: file.size, secondsLeft: null });
    request.upload.onprogress = ({ loaded }) => {
      const seconds = (performance.now() - startedMs) / 1_000;
      const secondsLeft = seconds > 0.5 && loaded > 0 ? (seconds / loaded) * (file.size - loaded) : null;
      setProgress({ name: file.name, sentBytes: Math.min(loaded, file.size), bytes: file.size, secondsLeft });
    };
    request.onload = () => {
      const answer = answerOf(request);
      end(answer.ok ? null : answer.sentence);
      if (answer.ok) onStored(answer.value);
    };
    request.onerror = () => end(silent);
    request.open('POST', `/api/files?${new URLSearchParams({ kind, name: file.name })}`);
    request.setRequestHeader('content-type', 'application/octet-stream');
    request.send(file);
  }

  function stop(): void {
    const name = progress?.name;
    running.current?.abort();
    end(name ? `${name} was not stored.` : null);
  }

  return { progress, problem, send, stop };
}

function answerOf(request: XMLHttpRequest): Outcome<FileFacts> {
  try {
    return JSON.parse(request.responseText) as Outcome<FileFacts>;
  } catch {
    return { ok: false, code: 'server-silent', sentence: silent };
  }
}

'use client';

import { Button } from '@/components/ui/button';
import { LoadingTicks } from '@/components/ui/loading-ticks';
import type { FileFacts } from '@/lib/contracts/file-upload';
import type { FileKind } from '@/lib/contracts/stored-states';
import { fileRules } from '@/lib/files/file-rules';
import { DropFrame } from './drop-frame';
import { useUpload } from './use-upload';

interface UploadFrameProps {
  kind: FileKind;
  /** Such as "Choose a photo". */
  label: string;
  onStored: (file: FileFacts) => void;
}

const kilobytes = (bytes: number) => `${Math.ceil(bytes / 1_000)} kB`;

/** Where a file is chosen or dropped, with its progress while it is sent; Stop is offered where that takes over 10 s. */
export function UploadFrame({ kind, label, onStored }: UploadFrameProps) {
  const { progress, problem, send, stop } = useUpload(kind, onStored);
  const { words, accept } = fileRules[kind];
  const left = progress?.secondsLeft ?? 0;
  return (
    <DropFrame
      label={label}
      kinds={words}
      accept={accept}
      chosen={progress?.name ?? null}
      problem={problem}
      onFile={send}
    >
      {progress ? (
        <div className="flex w-full flex-wrap items-center gap-x-5 gap-y-2">
          <div className="min-w-0 flex-1">
            <LoadingTicks
              label={
                progress.sentBytes < progress.bytes
                  ? `${kilobytes(progress.sentBytes)} of ${kilobytes(progress.bytes)}${left >= 1 ? `, ${Math.ceil(left)} s left` : ''}`
                  : 'Checking the file'
              }
              done={progress.sentBytes}
              of={progress.bytes}
            />
          </div>
          {left > 10 ? <Button onClick={stop}>Stop</Button> : null}
        </div>
      ) : null}
    </DropFrame>
  );
}

'use client';

import { Button } from '@/components/ui/button';
import type { FileKind } from '@/lib/contracts/stored-states';
import { UploadFrame } from './upload-frame';

interface PictureFieldProps {
  kind: Extract<FileKind, 'instruction-picture' | 'trimmer-photo'>;
  /** Names the picture: "Picture of the instruction". */
  label: string;
  /** Id of the stored file; null: none. */
  fileId: string | null;
  onChange: (fileId: string | null) => void;
  readOnly?: boolean;
}

/** A picture that can be chosen, replaced and removed. A new one is stored at once; what refers to it is saved by its owner. */
export function PictureField({ kind, label, fileId, onChange, readOnly = false }: PictureFieldProps) {
  return (
    <div role="group" aria-label={label} className="grid gap-2">
      {fileId ? (
        // eslint-disable-next-line @next/next/no-img-element -- behind the session, so no optimiser can fetch it.
        <img
          src={`/api/files/${fileId}`}
          alt={label}
          className="block max-h-80 max-w-full border-2 border-ink bg-sheet"
        />
      ) : readOnly ? (
        <p className="text-ink-2">No picture.</p>
      ) : null}
      {readOnly ? null : (
        <>
          <UploadFrame
            kind={kind}
            label={fileId ? 'Choose another picture' : 'Choose a picture'}
            onStored={(file) => onChange(file.id)}
          />
          {fileId ? (
            <span>
              <Button kind="link" onClick={() => onChange(null)}>
                Remove the picture
              </Button>
            </span>
          ) : null}
        </>
      )}
    </div>
  );
}

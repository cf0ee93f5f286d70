'use client';

import { Button } from '@/components/ui/button';
import { Section } from '@/components/ui/page-head';
import { TrimmerPicture } from '@/components/ui/trimmer-picture';
import { middleFrame } from '@/lib/board-type/trimmer-frame';
import type { FileFacts } from '@/lib/contracts/file-upload';
import { UploadFrame } from '../files/upload-frame';
import { useBoardTypeForm } from './form-context';
import { FrameEditor } from './frame-editor';

interface PicturesSectionProps {
  files: readonly FileFacts[];
  onStored: (file: FileFacts) => void;
}

/** The photograph that a bench shows where turning has no effect, and the drawing that a fixture is built and mended by. */
export function PicturesSection({ files, onStored }: PicturesSectionProps) {
  return (
    <>
      <Section
        title="Photo of the trimmer’s place"
        aside={<span className="text-cap text-ink-2">Operators see it when turning has no effect.</span>}
      >
        <PhotoField files={files} onStored={onStored} />
      </Section>
      <Section title="Fixture drawing">
        <DrawingField files={files} onStored={onStored} />
      </Section>
    </>
  );
}

function PhotoField({ files, onStored }: PicturesSectionProps) {
  const { form, readOnly, change } = useBoardTypeForm();
  const { trimmerPhoto: photo } = form;
  const facts = files.find(({ id }) => id === photo?.fileId);
  const proportion = facts?.width && facts.height ? facts.width / facts.height : undefined;
  if (readOnly)
    return photo ? (
      <TrimmerPicture photo={photo} label="Board with its trimmer" className="max-h-96" />
    ) : (
      <p className="text-ink-2">No photo. The bench draws a board in its place.</p>
    );
  return (
    <div className="grid gap-3">
      {photo ? (
        <FrameEditor photo={photo} proportion={proportion} onChange={(trimmerPhoto) => change({ trimmerPhoto })} />
      ) : null}
      <UploadFrame
        kind="trimmer-photo"
        label={photo ? 'Choose another photo' : 'Choose a photo'}
        onStored={(file) => {
          onStored(file);
          change({ trimmerPhoto: { fileId: file.id, frame: photo?.frame ?? middleFrame } });
        }}
      />
      {photo ? (
        <span>
          <Button kind="link" onClick={() => change({ trimmerPhoto: null })}>
            Remove the photo
          </Button>
        </span>
      ) : null}
    </div>
  );
}

function DrawingField({ files, onStored }: PicturesSectionProps) {
  const { form, readOnly, change } = useBoardTypeForm();
  const { fixtureDrawing: drawing } = form;
  const facts = drawing && files.find(({ id }) => id === drawing.fileId);
  const address = drawing ? `/api/files/${drawing.fileId}` : '';
  return (
    <div className="grid gap-3">
      {facts?.mediaType.startsWith('image/') ? (
        // eslint-disable-next-line @next/next/no-img-element -- behind the session, so no optimiser can fetch it.
        <img src={address} alt="Fixture drawing" className="block max-h-96 max-w-full border-2 border-ink bg-sheet" />
      ) : null}
      {drawing ? (
        <p>
          <a className="sw-link font-bold" href={address} target="_blank" rel="noreferrer">
            {facts?.name ?? 'The drawing'}
          </a>
          {facts ? <span className="text-ink-2">, {Math.ceil(facts.bytes / 1_000)} kB, opens in a new tab</span> : null}
        </p>
      ) : readOnly ? (
        <p className="text-ink-2">No drawing.</p>
      ) : null}
      {readOnly ? null : (
        <UploadFrame
          kind="fixture-drawing"
          label={drawing ? 'Choose another drawing' : 'Choose a drawing'}
          onStored={(file) => {
            onStored(file);
            change({ fixtureDrawing: { fileId: file.id } });
          }}
        />
      )}
      {drawing && !readOnly ? (
        <span>
          <Button kind="link" onClick={() => change({ fixtureDrawing: null })}>
            Remove the drawing
          </Button>
        </span>
      ) : null}
    </div>
  );
}

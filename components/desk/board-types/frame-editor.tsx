'use client';

import { useId, useRef, type KeyboardEvent, type PointerEvent } from 'react';
import { frameWords, moveFrame, resizeFrame } from '@/lib/board-type/trimmer-frame';
import type { TrimmerPhoto } from '@/lib/contracts/board-type';

interface FrameEditorProps {
  photo: TrimmerPhoto;
  /** Width over height, where it is known before the picture comes. */
  proportion: number | undefined;
  onChange: (photo: TrimmerPhoto) => void;
}

const steps: Record<string, readonly [number, number]> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
};
const stepShare = 0.01;

/** The frame around the trimmer: dragged, or moved with the arrow keys and sized with them and Shift. */
export function FrameEditor({ photo, proportion, onChange }: FrameEditorProps) {
  const id = useId();
  const picture = useRef<HTMLDivElement>(null);
  const held = useRef<{ x: number; y: number; sizes: boolean; photo: TrimmerPhoto } | null>(null);
  const { frame } = photo;
  const share = (value: number) => `${value * 100}%`;

  function key(event: KeyboardEvent): void {
    const step = steps[event.key];
    if (!step) return;
    event.preventDefault();
    const [right, down] = step.map((each) => each * stepShare) as [number, number];
    onChange({ ...photo, frame: (event.shiftKey ? resizeFrame : moveFrame)(frame, right, down) });
  }
  function take(event: PointerEvent<HTMLElement>, sizes: boolean): void {
    event.stopPropagation();
    event.currentTarget.setPointerCapture(event.pointerId);
    held.current = { x: event.clientX, y: event.clientY, sizes, photo };
  }
  function drag(event: PointerEvent): void {
    const box = picture.current?.getBoundingClientRect();
    if (!held.current || !box) return;
    const { x, y, sizes, photo: from } = held.current;
    const [right, down] = [(event.clientX - x) / box.width, (event.clientY - y) / box.height];
    onChange({ ...from, frame: (sizes ? resizeFrame : moveFrame)(from.frame, right, down) });
  }
  const drop = () => (held.current = null);
  return (
    <div className="grid gap-1.5">
      <div ref={picture} className="relative inline-block w-full max-w-xl">
        {/* eslint-disable-next-line @next/next/no-img-element -- behind the session, so no optimiser can fetch it. */}
        <img
          src={`/api/files/${photo.fileId}`}
          alt="Board with its trimmer"
          style={{ aspectRatio: proportion }}
          className="block w-full border-2 border-ink bg-sheet"
        />
        <button
          type="button"
          aria-label={`Frame around the trimmer: ${frameWords(frame)}`}
          aria-describedby={id}
          onKeyDown={key}
          onPointerDown={(event) => take(event, false)}
          onPointerMove={drag}
          onPointerUp={drop}
          onPointerCancel={drop}
          className="absolute cursor-move touch-none border-4 border-accent bg-transparent outline-2 outline-sheet"
          style={{ left: share(frame.x), top: share(frame.y), width: share(frame.width), height: share(frame.height) }}
        >
          {(['top-0 left-0', 'top-0 left-full', 'top-full left-0'] as const).map((place) => (
            <span
              key={place}
              aria-hidden="true"
              className={`absolute ${place} -m-1.5 size-2.5 border-2 border-accent bg-sheet`}
            />
          ))}
          <span
            aria-hidden="true"
            onPointerDown={(event) => take(event, true)}
            onPointerMove={drag}
            onPointerUp={drop}
            onPointerCancel={drop}
            className="absolute top-full left-full -m-3 size-6 cursor-nwse-resize touch-none border-2 border-accent bg-sheet"
          />
        </button>
      </div>
      <p id={id} className="text-cap text-ink-2">
        Drag the frame around the screw, or move it with the arrow keys; Shift and arrow keys size it.
      </p>
    </div>
  );
}

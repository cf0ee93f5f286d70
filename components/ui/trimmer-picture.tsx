'use client';

import { useState, type ReactNode } from 'react';
import type { TrimmerPhoto } from '@/lib/contracts/board-type';

interface TrimmerPictureProps {
  photo: TrimmerPhoto;
  label: string;
  /** In its place when the photograph does not come. */
  otherwise?: ReactNode;
  className?: string;
}

/** The photograph of a board with a blue frame around its trimmer; a light edge keeps the frame in sight on any board. */
export function TrimmerPicture({
  photo: { fileId, frame },
  label,
  otherwise = null,
  className = '',
}: TrimmerPictureProps) {
  const [missing, setMissing] = useState<string | null>(null);
  if (missing === fileId) return otherwise;
  const share = (value: number) => `${value * 100}%`;
  return (
    <span className="relative inline-block max-w-full">
      {/* eslint-disable-next-line @next/next/no-img-element -- behind the session, so no optimiser can fetch it. */}
      <img
        src={`/api/files/${fileId}`}
        alt={label}
        onError={() => setMissing(fileId)}
        className={`block max-w-full border-2 border-ink bg-sheet ${className}`}
      />
      <span
        aria-hidden="true"
        className="absolute border-4 border-accent outline-2 outline-sheet"
        style={{ left: share(frame.x), top: share(frame.y), width: share(frame.width), height: share(frame.height) }}
      />
    </span>
  );
}

import type { ReactNode } from 'react';
import type { Direction } from '@/lib/trim/types';

/** Clockwise puts the words right of the dial, anticlockwise left, so that even the layout tells the way. */
export function DialBesideWords({
  direction,
  dial,
  words,
}: {
  direction: Direction;
  dial: ReactNode;
  words: ReactNode;
}) {
  const left = direction === 'anticlockwise';
  return (
    <div
      className={`flex h-full min-h-0 items-center gap-8 px-8 py-5 max-[900px]:flex-col-reverse ${left ? 'flex-row-reverse' : ''}`}
    >
      <div className="flex min-h-0 min-w-0 flex-1 items-center justify-center">
        <div className={`${left ? 'w-132' : 'w-165'} max-w-full`}>{dial}</div>
      </div>
      <div className={`flex-none self-stretch max-[900px]:w-full ${left ? 'w-160' : 'w-139'} max-w-full`}>{words}</div>
    </div>
  );
}

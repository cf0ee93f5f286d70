import type { ReactNode } from 'react';
import { Fitted } from '../fitted';

interface PlainScreenProps {
  /** What to do, in blue when it is the operator's move. */
  title: string;
  move?: boolean;
  picture?: ReactNode;
  children?: ReactNode;
}

/** One move or one wait in big words, with a picture at the right. */
export function PlainScreen({ title, move = true, picture, children }: PlainScreenProps) {
  return (
    <div className="flex h-full items-center gap-14 px-16 py-8 pr-12 max-[900px]:flex-col max-[900px]:items-start">
      <div className="flex min-w-0 flex-1 flex-col gap-10">
        <Fitted
          as="h1"
          text={title}
          most={132}
          width={picture ? 680 : 1120}
          className={move ? 'text-accent' : 'text-ink'}
        />
        <div className="text-[calc(44*var(--sw-b))] leading-[1.3]">{children}</div>
      </div>
      {picture && <div className="w-95 flex-none max-[900px]:w-60">{picture}</div>}
    </div>
  );
}

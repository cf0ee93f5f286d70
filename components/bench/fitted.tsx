import type { CSSProperties, ReactNode } from 'react';

/** Average width of a character of our bold face, as a share of the size. */
const characterWidth = 0.56;

/** Largest size up to `most` at which the longest line of `text` fits `width`. Pixels of the bench drawing. */
export function fittedSize(text: string, most: number, width: number): number {
  const longest = Math.max(...text.split('\n').map((line) => line.length), 1);
  return Math.round(Math.min(most, width / (longest * characterWidth)));
}

interface FittedProps {
  text: string;
  most: number;
  width: number;
  /** The same on a narrow screen, which is 900 wide. */
  narrow?: number;
  as?: 'h1' | 'h2' | 'p' | 'span';
  className?: string;
  children?: ReactNode;
}

/** Big words that shrink for a longer language instead of running out of the screen. */
export function Fitted({ text, most, width, narrow = 780, as: Tag = 'p', className = '', children }: FittedProps) {
  const sizes = {
    '--wide': fittedSize(text, most, width),
    '--narrow': fittedSize(text, most, Math.min(width, narrow)),
  } as CSSProperties;
  return (
    <Tag
      className={`sw-fitted leading-[0.96] font-bold tracking-[-0.01em] whitespace-pre-line ${className}`}
      style={sizes}
    >
      {children ?? text}
    </Tag>
  );
}

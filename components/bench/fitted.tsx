import type { ReactNode } from 'react';

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
  as?: 'h1' | 'h2' | 'p' | 'span';
  className?: string;
  children?: ReactNode;
}

/** Big words that shrink for a longer language instead of running out of the screen. */
export function Fitted({ text, most, width, as: Tag = 'p', className = '', children }: FittedProps) {
  const size = fittedSize(text, most, width);
  return (
    <Tag
      className={`leading-[0.96] font-bold tracking-[-0.01em] whitespace-pre-line ${className}`}
      style={{ fontSize: `calc(${size} * var(--sw-b))` }}
    >
      {children ?? text}
    </Tag>
  );
}

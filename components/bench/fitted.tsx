import type { CSSProperties, ReactNode } from 'react';

/** Widths of our bold face as shares of the size, a little generous. */
const widthOf = (character: string) =>
  /[A-ZÄÖÜ]/.test(character) ? 0.63 : /[\s.,;:il’']/.test(character) ? 0.34 : 0.56;
const widthOfLine = (line: string) => [...line].reduce((sum, character) => sum + widthOf(character), 0);

/** Largest size up to `most` at which the longest line of `text` fits `width`. Pixels of the bench drawing. */
export function fittedSize(text: string, most: number, width: number): number {
  const longest = Math.max(...text.split('\n').map(widthOfLine), 0.5);
  return Math.round(Math.min(most, width / longest));
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

import type { ReactNode } from 'react';

/** Four blue corners and a line across: hold the scanner here. */
export function ScanFrame({ children }: { children: ReactNode }) {
  return (
    <svg viewBox="0 0 1140 192" aria-hidden="true" className="block h-auto w-full">
      {children}
      <g fill="none" stroke="var(--sw-accent)" strokeWidth={6}>
        <path d="M3 58V3H60M1080 3h57V58M3 134v55H60M1080 189h57V134" />
        <path d="M58 96H1082" strokeWidth={10} />
      </g>
    </svg>
  );
}

const bars = [
  12, 8, 4, 8, 4, 10, 12, 6, 16, 8, 10, 8, 4, 6, 6, 8, 16, 8, 12, 10, 6, 6, 10, 6, 6, 4, 4, 6, 12, 8, 16, 6, 12, 10, 4,
  10, 4, 8, 10, 8, 4, 10, 12, 6, 8, 6, 14, 12, 4, 8, 4, 8, 12, 10, 4, 6, 8, 8, 10, 4, 4, 6, 14, 6, 8, 6, 4, 8, 12, 4,
  10,
];

/** Bars as a picture only; it reads as nothing. */
export function BarsPicture({ x, y, width, height }: { x: number; y: number; width: number; height: number }) {
  const sum = bars.reduce((a, b) => a + b, 0);
  let at = x;
  const drawn: string[] = [];
  bars.forEach((bar, i) => {
    const wide = (bar / sum) * width;
    if (i % 2 === 0) drawn.push(`M${at.toFixed(1)} ${y}h${wide.toFixed(1)}v${height}h${(-wide).toFixed(1)}z`);
    at += wide;
  });
  return <path d={drawn.join('')} fill="var(--sw-ink)" />;
}

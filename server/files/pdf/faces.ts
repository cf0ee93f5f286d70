import path from 'node:path';

// The variable cuts do not embed in a PDF; these are the static ones of the same faces.
const fontFile = (face: string, weight: number) =>
  path.join(process.cwd(), `node_modules/@fontsource/${face}/files/${face}-latin-${weight}-normal.woff`);

/** Files of our faces, embedded in every PDF. */
export const faces = {
  text: fontFile('atkinson-hyperlegible-next', 400),
  bold: fontFile('atkinson-hyperlegible-next', 700),
  num: fontFile('atkinson-hyperlegible-mono', 400),
  'num-bold': fontFile('atkinson-hyperlegible-mono', 700),
};
export type Face = keyof typeof faces;

const near: Record<string, string> = {
  '≤': 'max',
  '≥': 'min',
  Ω: 'ohm',
  µ: 'u',
  μ: 'u',
  ł: 'l',
  Ł: 'L',
  đ: 'd',
  Đ: 'D',
  ı: 'i',
};
const drawn = /[\x20-\x7e\xa1-\xb4\xb6-\xff–—‘-”…−€]/;

/** Text in the letters that the faces have: others by their base letter or the nearest word, else a question mark. */
export function printable(text: string): string {
  return [...text.replace(/\s/g, ' ')]
    .map((letter) => {
      if (drawn.test(letter)) return letter;
      const base = near[letter] ?? letter.normalize('NFD').charAt(0);
      return base !== letter && drawn.test(base.charAt(0)) ? base : '?';
    })
    .join('');
}

/** A serial pattern taken apart: what it matches in words, and serials it takes. */
export type SerialPatternReading =
  { ok: true; expression: RegExp; words: string; example: string; longest: number } | { ok: false; sentence: string };

interface Piece {
  kind: 'text' | 'digit' | 'letter' | 'class';
  /** Written characters of `text`; the class itself of `class`. */
  text: string;
  least: number;
  most: number;
}

const longestSerial = 40;

/**
 * Reads a pattern of text, \d, [A-Z], [0-9] or a class of characters, each perhaps with {n} or {n,m}, between ^ and $. Less than
 * all that expressions can say, so that it can be told in words and never takes long to match.
 */
export function readSerialPattern(pattern: string): SerialPatternReading {
  if (!pattern.startsWith('^') || !/(?<!\\)\$$/.test(pattern))
    return { ok: false, sentence: 'Begin with ^ and end with $, so that nothing else may stand beside the serial.' };
  const pieces = piecesOf(pattern.slice(1, -1));
  if (!pieces)
    return {
      ok: false,
      sentence: 'Use letters, digits, hyphens, \\d, [A-Z] and {n} only, such as ^CB1210\\d{9}$.',
    };
  const longest = pieces.reduce((sum, piece) => sum + piece.most, 0);
  if (pieces.length === 0 || longest > longestSerial)
    return { ok: false, sentence: `A serial has 1 to ${longestSerial} characters. This pattern allows ${longest}.` };
  let expression: RegExp;
  try {
    expression = new RegExp(pattern);
  } catch {
    return { ok: false, sentence: 'The pattern does not compile. Check its brackets.' };
  }
  if (!pieces.some(({ kind }) => kind !== 'text'))
    return { ok: false, sentence: 'Every board would have the same serial. Add digits, such as \\d{5}.' };
  const merged = mergeDigits(pieces);
  return { ok: true, expression, words: merged.map(wordsOf).join(', then '), example: exampleOf(merged), longest };
}

/** Null: something that is not understood. */
function piecesOf(source: string): Piece[] | null {
  const token = /(\\d|\[0-9\])|(\[A-Z\])|(\[[A-Za-z0-9-]+\])|(\\?-|[A-Za-z0-9])/y;
  const counted = /\{(\d+)(?:,(\d+))?\}/y;
  const pieces: Piece[] = [];
  let at = 0;
  while (at < source.length) {
    token.lastIndex = at;
    const match = token.exec(source);
    if (!match) return null;
    at = token.lastIndex;
    counted.lastIndex = at;
    const count = counted.exec(source);
    if (count) at = counted.lastIndex;
    const least = Number(count?.[1] ?? 1);
    const most = Number(count?.[2] ?? least);
    if (most < least || most === 0) return null;
    const kind = match[1] ? 'digit' : match[2] ? 'letter' : match[3] ? 'class' : 'text';
    const before = pieces.at(-1);
    const text = match[0].replace('\\-', '-');
    if (kind === 'text' && before?.kind === 'text') before.text += text.repeat(least);
    else pieces.push({ kind, text: kind === 'text' ? text.repeat(least) : text, least, most });
    if (kind === 'text' && most !== least) return null;
    const last = pieces.at(-1)!;
    if (last.kind === 'text') last.least = last.most = last.text.length;
  }
  return pieces;
}

/** \d{4}\d{5} says the same as \d{9}. */
function mergeDigits(pieces: Piece[]): Piece[] {
  const merged: Piece[] = [];
  for (const piece of pieces) {
    const before = merged.at(-1);
    if (before && before.kind === piece.kind && piece.kind !== 'text' && before.text === piece.text) {
      before.least += piece.least;
      before.most += piece.most;
    } else merged.push({ ...piece });
  }
  return merged;
}

function wordsOf({ kind, text, least, most }: Piece): string {
  if (kind === 'text') return text;
  const noun = { digit: 'digit', letter: 'capital', class: `of ${text.slice(1, -1)}` }[kind];
  const many = most > 1 && kind !== 'class' ? 's' : '';
  return `${least === most ? least : `${least} to ${most}`} ${noun}${many}`;
}

function exampleOf(pieces: Piece[]): string {
  return pieces
    .map(({ kind, text, most }) => {
      if (kind === 'text') return text;
      const from = kind === 'digit' ? '1234567890' : kind === 'letter' ? 'ABCDEFGHIJKLMNOPQRSTUVWXYZ' : text[1]!;
      return from.repeat(Math.ceil(most / from.length)).slice(0, most);
    })
    .join('');
}

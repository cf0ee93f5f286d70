import JsBarcode from 'jsbarcode';

/**
 * Code 128 (ISO/IEC 15417), digit pairs in set C wherever they save symbols. `bits` has one character a module, `1` a bar,
 * without the quiet zones.
 */
export interface Code128 {
  text: string;
  bits: string;
}

/** Each side needs ten modules of blank ground (ISO/IEC 15417). */
export const quietModules = 10;

/** Printable ASCII. */
export const code128Text = /^[\x20-\x7e]{1,80}$/;

/** Null when the text has a character that Code 128 sets B and C cannot carry, or is empty. */
export function encodeCode128(text: string): Code128 | null {
  if (!code128Text.test(text)) return null;
  const drawn: { encodings?: { data: string }[] } = {};
  JsBarcode(drawn, text, { format: 'CODE128', displayValue: false });
  const bits = (drawn.encodings ?? []).map((part) => part.data).join('');
  return { text, bits };
}

/** Modules from the left edge of one quiet zone to the right edge of the other. */
export function widthInModules(code: Code128): number {
  return code.bits.length + 2 * quietModules;
}

/** A type told by the first bytes of a file, whatever its name says. */
export type RecognisedType = 'JPEG' | 'PNG' | 'WebP' | 'PDF' | 'GIF' | 'TIFF' | 'BMP' | 'SVG' | 'HEIF' | 'ZIP';

const ascii = (bytes: Uint8Array, from: number, length: number) =>
  String.fromCharCode(...bytes.subarray(from, from + length));

/** Null: none that is known here. Signatures as in the formats' own specifications (ISO 10918-1, 15948, 32000-1; RFC 9649). */
export function recogniseType(bytes: Uint8Array): RecognisedType | null {
  if (bytes[0] === 0xff && bytes[1] === 0xd8 && bytes[2] === 0xff) return 'JPEG';
  if (ascii(bytes, 0, 8) === '\x89PNG\r\n\x1a\n') return 'PNG';
  if (ascii(bytes, 0, 4) === 'RIFF' && ascii(bytes, 8, 4) === 'WEBP') return 'WebP';
  if (ascii(bytes, 0, 5) === '%PDF-') return 'PDF';
  if (/^GIF8[79]a$/.test(ascii(bytes, 0, 6))) return 'GIF';
  if (/^(II\*\0|MM\0\*)$/.test(ascii(bytes, 0, 4))) return 'TIFF';
  if (ascii(bytes, 0, 2) === 'BM' && bytes.length > 26) return 'BMP';
  if (ascii(bytes, 4, 4) === 'ftyp' && /^(heic|heix|mif1|avif)$/.test(ascii(bytes, 8, 4))) return 'HEIF';
  if (ascii(bytes, 0, 4) === 'PK\x03\x04') return 'ZIP';
  return /^\s*(<\?xml[^>]*>\s*)?(<!--[^]*?-->\s*)*<svg[\s>]/.test(
    ascii(bytes, 0, 400).replace(/^\u00ef\u00bb\u00bf/, ''),
  )
    ? 'SVG'
    : null;
}

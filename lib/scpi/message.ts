export interface MessageUnit {
  /** Full header from the root, without the leading colon. */
  header: string;
  parameters: string[];
}

/**
 * Splits a program message at its semicolons and completes each header: after `VOLT:PROT 13;PROT:CLE` the second unit
 * continues at the level of the first, a leading colon returns to the root and common commands leave the level alone
 * (SCPI-1999 volume 1, 6.2.4).
 */
export function parseProgramMessage(message: string): MessageUnit[] {
  let path = '';
  const units: MessageUnit[] = [];
  for (const part of splitOutside(message, ';')) {
    const text = part.trim();
    if (text === '') continue;
    const space = text.search(/\s/);
    const written = space < 0 ? text : text.slice(0, space);
    const parameters = space < 0 ? [] : splitOutside(text.slice(space + 1), ',').map((item) => item.trim());
    if (written.startsWith('*')) {
      units.push({ header: written, parameters });
      continue;
    }
    const header = written.startsWith(':') ? written.slice(1) : path + written;
    path = header.slice(0, header.lastIndexOf(':') + 1);
    units.push({ header, parameters });
  }
  return units;
}

/** Splits at `separator` where it stands outside quotes and parentheses. */
function splitOutside(text: string, separator: string): string[] {
  if (!text.includes(separator)) return [text];
  const parts: string[] = [];
  let start = 0;
  let depth = 0;
  let quote = '';
  for (let i = 0; i < text.length; i++) {
    const character = text[i]!;
    if (quote) {
      if (character === quote) quote = '';
    } else if (character === '"' || character === "'") quote = character;
    else if (character === '(') depth++;
    else if (character === ')') depth--;
    else if (character === separator && depth === 0) {
      parts.push(text.slice(start, i));
      start = i + 1;
    }
  }
  parts.push(text.slice(start));
  return parts;
}

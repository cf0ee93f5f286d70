/**
 * What a barcode of the shop floor means. Ours carry a prefix; anything else is read as the serial number of a board,
 * a reference board among them. `code` is the whole text, `short` what is printed large beside it.
 */
export type ScanCode = { kind: 'badge' | 'lot' | 'bin' | 'serial'; code: string; short: string };

export const scanPrefixes = { badge: 'SWB-', lot: 'SWL-', bin: 'SWN-' } as const;

/** The text to print as Code 128 on a badge, a lot sheet or a bin. */
export function printCode(kind: keyof typeof scanPrefixes, short: string): string {
  return scanPrefixes[kind] + short.trim().toUpperCase();
}

export function readScan(text: string): ScanCode {
  const code = text.trim().toUpperCase();
  for (const kind of ['badge', 'lot', 'bin'] as const) {
    const prefix = scanPrefixes[kind];
    if (code.startsWith(prefix)) return { kind, code, short: code.slice(prefix.length) };
  }
  return { kind: 'serial', code, short: code };
}

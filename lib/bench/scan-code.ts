/**
 * What a barcode of the shop floor means. Ours carry a prefix; anything else is read as a serial number.
 * `kind` is `serial` for a board and `reference` for the station's reference board.
 */
export type ScanCode =
  | { kind: 'badge'; number: string }
  | { kind: 'lot'; code: string }
  | { kind: 'bin'; code: string }
  | { kind: 'reference'; code: string }
  | { kind: 'serial'; serial: string };

export const scanPrefixes = { badge: 'SWB-', lot: 'SWL-', bin: 'SWN-', reference: 'SWR-' } as const;

/** The text to print as Code 128 on a badge, a lot sheet, a bin or a reference board. */
export function printCode(kind: keyof typeof scanPrefixes, code: string): string {
  return scanPrefixes[kind] + code;
}

export function readScan(text: string): ScanCode {
  const code = text.trim().toUpperCase();
  const rest = (prefix: string) => code.slice(prefix.length).trim();
  if (code.startsWith(scanPrefixes.badge)) return { kind: 'badge', number: rest(scanPrefixes.badge) };
  if (code.startsWith(scanPrefixes.lot)) return { kind: 'lot', code: rest(scanPrefixes.lot) };
  if (code.startsWith(scanPrefixes.bin)) return { kind: 'bin', code: rest(scanPrefixes.bin) };
  if (code.startsWith(scanPrefixes.reference)) return { kind: 'reference', code: rest(scanPrefixes.reference) };
  return { kind: 'serial', serial: code };
}

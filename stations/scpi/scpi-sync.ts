import type { SyncWords } from '../link/sync-words';

const distinct = 4;

/**
 * `*OPC?;*IDN?`, with more `*OPC?` each time: the answers `1;…`, `1;1;…` tell which request they belong to, so neither
 * a late reading nor the late answer to an earlier attempt is taken for it. `*IDN?` stands last, since the end of its
 * answer is arbitrary text (IEEE 488.2 10.14.3). The first starts with two, unlike any single answer.
 */
export const scpiSync: SyncWords = (n) => {
  const ones = (n % distinct) + 2;
  const start = '1;'.repeat(ones);
  return {
    message: `${'*OPC?;'.repeat(ones)}*IDN?`,
    isAnswer: (line) => line.startsWith(start) && isIdentity(line.slice(start.length)),
  };
};

/** Manufacturer, model, serial number, firmware: four fields (IEEE 488.2 10.14). */
export function isIdentity(text: string): boolean {
  return text.split(',').length >= 4 && !text.startsWith('1;');
}

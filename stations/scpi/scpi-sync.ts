import type { SyncWords } from '../link/sync-words';

/** Requests in a row that differ from each other. */
const distinct = 4;
const onesOf = (n: number) => (n % distinct) + 2;

/**
 * `*OPC?;*IDN?`, with more `*OPC?` each time: the answers `1;…`, `1;1;…` tell which request they belong to, so neither
 * a late reading nor the late answer to an earlier attempt is taken for it. `*IDN?` stands last, since the end of its
 * answer is arbitrary text (IEEE 488.2 10.14.3). The first starts with two, unlike any single answer.
 */
export const scpiSync: SyncWords = (n) => {
  const ones = onesOf(n);
  const start = '1;'.repeat(ones);
  return {
    message: `${'*OPC?;'.repeat(ones)}*IDN?`,
    isAnswer: (line) => line.startsWith(start) && isIdentity(line.slice(start.length)),
    couldBeLate: (line, asked) => line.startsWith('1;') && !asked.includes(';'),
  };
};

/** The same line by line, for an instrument that takes one query a message: an identity after just so many ones. */
export const scpiSyncByLines: SyncWords = (n) => {
  const wanted = onesOf(n);
  let ones = 0;
  return {
    message: `${'*OPC?\n'.repeat(wanted)}*IDN?`,
    isAnswer(line) {
      if (line === '1') {
        ones++;
        return false;
      }
      const answered = ones === wanted && isIdentity(line);
      ones = 0;
      return answered;
    },
    couldBeLate: (line, asked) => (line === '1' || isIdentity(line)) && !asked.includes('*IDN?'),
  };
};

/** Manufacturer, model, serial number, firmware: four fields (IEEE 488.2 10.14). */
function isIdentity(text: string): boolean {
  return text.split(',').length >= 4 && !text.startsWith('1;');
}

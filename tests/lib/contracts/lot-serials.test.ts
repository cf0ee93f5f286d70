import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkSerials, countUpSerials, readSerialFile } from '@/lib/contracts/lot-serials';

const cb = { pattern: '^CB1210\\d{9}$', boardTypeCode: 'CB1210', lotOf: new Map([['CB1210264800009', '2648-A']]) };
const rowsOf = (text: string) => {
  const list = readSerialFile(text);
  if (!list.ok) throw new Error(list.sentence);
  return list.rows;
};
const problemsOf = (text: string) => checkSerials(rowsOf(text), cb).map((row) => row.problem);

describe('a file of serial numbers', () => {
  it.each([
    ['one column', 'CB1210264800001\nCB1210264800002\n'],
    ['a heading', 'Serial number\nCB1210264800001\nCB1210264800002'],
    ['a column among others', 'panel,serial,made\n1,CB1210264800001,26-11-23\n1,CB1210264800002,26-11-23'],
    ['semicolons', 'Panel;Serial\n1;CB1210264800001\n2;CB1210264800002'],
    [
      'tabs, a byte order mark and Windows line ends',
      '\ufeffserial\tpanel\r\nCB1210264800001\t1\r\nCB1210264800002\t1\r\n',
    ],
    ['quotes, blanks and small letters', '"serial"\n" cb1210264800001 "\ncb1210264800002\n'],
    ['empty lines', '\nCB1210264800001\n\n\nCB1210264800002\n\n'],
  ])('is read with %s', (_, text) => {
    expect(rowsOf(text).map((row) => row.serial)).toEqual(['CB1210264800001', 'CB1210264800002']);
  });

  it('names the line of the file for each row', () => {
    expect(rowsOf('serial\nA1\n\nA2\n').map((row) => row.line)).toEqual([2, 4]);
  });

  it.each([
    ['', 'is empty'],
    ['serial\n', 'no serial number below'],
    ['a,b\n1,2\n', 'Name the one'],
    ['serial\n"A1\nA2\n', 'not a readable CSV'],
    [`serial\n${'A1\n'.repeat(5_001)}`, 'at most 5000'],
  ])('%j is refused with a sentence', (text, part) => {
    expect(readSerialFile(text)).toMatchObject({ ok: false, sentence: expect.stringContaining(part) });
  });

  it('never throws, whatever the file is', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary' }), (text) => void readSerialFile(text)));
  });

  it('says beside each bad row what is wrong, and nothing beside the good ones', () => {
    const text = ['serial', 'CB1210264800001', 'CB121026480000', 'CB1210264800001', 'CB1210264800009', 'SWB-14'].join(
      '\n',
    );
    expect(problemsOf(text)).toEqual([
      null,
      'Not a serial number of CB1210.',
      'The same as on line 2.',
      'Already in lot 2648-A.',
      'SWB- begins our own barcodes for badges, lots and bins. Use another serial number.',
    ]);
  });

  it('says so of a row without a serial among other columns', () => {
    expect(problemsOf('serial,panel\n,7\nCB1210264800001,7')).toEqual(['No serial number on this line.', null]);
  });

  it('refuses serials that no label can carry', () => {
    const rows = [{ line: 1, serial: 'ABCDEFGHIJKLMNOPQRSTUVWX' }];
    expect(checkSerials(rows, { pattern: '.', boardTypeCode: 'X', lotOf: new Map() })[0]!.problem).toContain(
      'Too long',
    );
  });
});

describe('serials counted up', () => {
  it('keep their width', () => {
    const list = countUpSerials('cb1210264800098', 3);
    expect(list.ok && list.rows.map((row) => row.serial)).toEqual([
      'CB1210264800098',
      'CB1210264800099',
      'CB1210264800100',
    ]);
  });
  it('are refused when the digits do not suffice, or are missing', () => {
    expect(countUpSerials('X98', 3)).toMatchObject({
      ok: false,
      sentence: 'X98 cannot be counted up 3 times in 2 digits.',
    });
    expect(countUpSerials('CB-A', 3)).toMatchObject({ ok: false });
  });
  it('are all different and in order', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 99_000 }), fc.integer({ min: 1, max: 500 }), (start, quantity) => {
        const list = countUpSerials(`CB${String(start).padStart(12, '0')}`, quantity);
        const serials = list.ok ? list.rows.map((row) => row.serial) : [];
        expect(new Set(serials).size).toBe(quantity);
        expect([...serials].sort()).toEqual(serials);
      }),
    );
  });
});

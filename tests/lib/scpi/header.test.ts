import { describe, expect, it } from 'vitest';
import { headerMatches } from '@/lib/scpi/header';

const volt = '[SOURce:]VOLTage[:LEVel][:IMMediate][:AMPLitude]';

describe('headerMatches', () => {
  it.each([
    'VOLT',
    'volt',
    'VOLTage',
    ':VOLT',
    'SOUR:VOLT',
    'SOURCE:VOLTAGE:LEVEL:IMMEDIATE:AMPLITUDE',
    'VOLT:AMPL',
    'volt:lev:ampl',
  ])('takes %s for the level of a voltage', (header) => expect(headerMatches(volt, header)).toBe(true));

  it.each(['VOLTA', 'VOL', 'VOLTAG', 'VOLT?', 'VOLT:PROT', 'SOUR', 'CURR', 'VOLT:IMM:LEV', ''])(
    'refuses %s',
    (header) => expect(headerMatches(volt, header)).toBe(false),
  );

  it('tells a query from a command', () => {
    expect(headerMatches('INPut:BOARd?', 'INP:BOAR?')).toBe(true);
    expect(headerMatches('INPut:BOARd?', 'INP:BOAR')).toBe(false);
  });

  it('takes common commands whole', () => {
    expect(headerMatches('*IDN?', '*idn?')).toBe(true);
    expect(headerMatches('*IDN?', '*ID?')).toBe(false);
  });
});

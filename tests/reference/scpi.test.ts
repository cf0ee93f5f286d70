import { describe, expect, it } from 'vitest';
import { headerMatches } from '@/lib/scpi/header';
import { parseScpiNumber } from '@/lib/scpi/number';
import { scpiErrorClass, scpiErrorTexts } from '@/lib/scpi/queued-error';
import reference from './scpi.json';

const value = (told: number | string | null) =>
  told === 'NaN' ? NaN : told === '+Infinity' ? Infinity : told === '-Infinity' ? -Infinity : told;

describe('SCPI-1999 and IEEE 488.2', () => {
  it.each(reference.numbers)('reads $text as $value', ({ text, value: told }) => {
    expect(parseScpiNumber(text)).toEqual(value(told));
  });

  it.each(reference.errors)('knows $code as $text', ({ code, text }) => {
    const known = (scpiErrorTexts as Record<number, string>)[code];
    // The reference header leaves out the hyphen that SCPI-1999 writes.
    expect(known?.replace('Device-specific', 'Device specific')).toBe(
      text.replace('Device-specific', 'Device specific'),
    );
  });

  it.each(reference.errorClasses)('puts $range into the class $class', ({ range, class: told }) => {
    const [high, low] = range.match(/-\d+/g)!.map(Number);
    const word = told.split(/[ -]/)[0];
    for (const code of [high!, low!, Math.round((high! + low!) / 2)]) expect(scpiErrorClass(code)).toBe(word);
    if (range.includes('positive')) expect(scpiErrorClass(42)).toBe(word);
  });

  it.each(reference.commonCommands)('takes the common command %s in either case', (command) => {
    expect(headerMatches(command, command.toLowerCase())).toBe(true);
  });
});

import { describe, expect, it } from 'vitest';
import { parseChannelList } from '@/lib/scpi/channel-list';
import { parseProgramMessage } from '@/lib/scpi/message';
import { formatQueuedError, parseQueuedError, scpiErrorClass } from '@/lib/scpi/queued-error';

const headers = (message: string) => parseProgramMessage(message).map(({ header }) => header);

describe('parseProgramMessage', () => {
  it('continues at the level of the unit before, from the root after a colon', () => {
    expect(headers('VOLT:PROT 13;TRIP?')).toEqual(['VOLT:PROT', 'VOLT:TRIP?']);
    expect(headers('VOLT:PROT:TRIP?;CLE')).toEqual(['VOLT:PROT:TRIP?', 'VOLT:PROT:CLE']);
    expect(headers('VOLT 9;:SYST:ERR?')).toEqual(['VOLT', 'SYST:ERR?']);
  });

  it('keeps the level across common commands', () => {
    expect(headers('SOUR:VOLT 1;*OPC?;CURR 2')).toEqual(['SOUR:VOLT', '*OPC?', 'SOUR:CURR']);
  });

  it('does not split inside quotes or channel lists', () => {
    expect(parseProgramMessage('ROUT:CLOS (@101,102);DISP:TEXT "a;b, c"')).toEqual([
      { header: 'ROUT:CLOS', parameters: ['(@101,102)'] },
      { header: 'ROUT:DISP:TEXT', parameters: ['"a;b, c"'] },
    ]);
  });

  it('ignores empty units and white space', () => {
    expect(parseProgramMessage(' ; VOLT   9.5 , 2 ;; ')).toEqual([{ header: 'VOLT', parameters: ['9.5', '2'] }]);
  });
});

describe('parseQueuedError', () => {
  it('reads a code and its text', () => {
    expect(parseQueuedError('-113,"Undefined header"')).toEqual({ code: -113, message: 'Undefined header' });
    expect(parseQueuedError('+0,"No error"')).toEqual({ code: 0, message: 'No error' });
    expect(parseQueuedError('-222, "Data out of range;VOLT 99"')).toEqual({
      code: -222,
      message: 'Data out of range;VOLT 99',
    });
  });

  it('keeps doubled quotes through a round trip', () => {
    const error = { code: -300, message: 'Relay "3" stuck' };
    expect(parseQueuedError(formatQueuedError(error))).toEqual(error);
  });

  it('returns null for a reading or for nothing', () => {
    for (const text of ['+9.01E+00', '', 'ready', '1;0,"No error"']) expect(parseQueuedError(text), text).toBeNull();
  });

  it('knows the class of a code by its range', () => {
    expect([0, -113, -222, -350, 17, -410, -500].map(scpiErrorClass)).toEqual([
      'none',
      'command',
      'execution',
      'device',
      'device',
      'query',
      'unknown',
    ]);
  });
});

describe('parseChannelList', () => {
  it('reads single channels, lists and ranges', () => {
    expect(parseChannelList('(@101)')).toEqual([101]);
    expect(parseChannelList('(@101,103:104)')).toEqual([101, 103, 104]);
  });

  it('returns null for anything else', () => {
    for (const text of ['101', '(101)', '(@)', '(@104:101)', '(@1:2:3)', '(@1,)', '(@a)'])
      expect(parseChannelList(text), text).toBeNull();
  });
});

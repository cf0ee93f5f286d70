import { beforeEach, describe, expect, it } from 'vitest';
import { VirtualClock } from '@/stations/clock/virtual-clock';
import { SerialLink } from '@/stations/link/serial-link';
import { ScpiSession, type SessionWords } from '@/stations/scpi/scpi-session';
import { scpiSync } from '@/stations/scpi/scpi-sync';
import { Refusal, ScpiInstrument, type CommandTable } from '@/stations/simulation/scpi-instrument';
import { SimulatedPort } from '@/stations/simulation/simulated-binding';

class Device extends ScpiInstrument {
  heard: string[] = [];
  reading = '+9.01234567E+00';
  protected override readonly commands: CommandTable = {
    'SYSTem:REMote': () => void this.heard.push('remote'),
    VALue: ([text]) => {
      this.heard.push(`value ${text}`);
      if (text === '99') throw new Refusal(-222);
    },
    'READ?': () => this.reading,
  };
}

const words: SessionWords = { opening: [], nextError: 'SYST:ERR?', compound: true, terminator: '\n', deadlineMs: 500 };
let clock: VirtualClock;
let device: Device;
let port: SimulatedPort;
let session: ScpiSession;

async function open(changed: Partial<SessionWords> = {}): Promise<void> {
  clock = new VirtualClock();
  device = new Device(clock, 'MAKER,DEVICE,1,1');
  port = new SimulatedPort(device);
  const link = new SerialLink({
    instrument: 'meter',
    path: port.path,
    binding: port.binding,
    baudRate: 115_200,
    clock,
    sync: scpiSync,
    terminator: '\n',
  });
  await link.open();
  session = new ScpiSession(link, { ...words, ...changed });
}

beforeEach(() => open());

describe.each([{ compound: true }, { compound: false }])('ScpiSession, compound $compound', ({ compound }) => {
  beforeEach(() => open({ compound }));

  it('reads the error queue after a command and throws what it holds', async () => {
    await session.command('VAL 5');
    await expect(session.command('VAL 99')).rejects.toMatchObject({
      code: 'instrument-error',
      instrument: 'meter',
      queued: [{ code: -222, message: 'Data out of range' }],
    });
    expect(device.heard).toEqual(['value 5', 'value 99']);
    expect(await session.readErrors()).toEqual([]);
  });

  it('drains the whole queue, so that an old error is not blamed on the next command', async () => {
    await session.link.send('NONSENSE');
    await session.link.send('VAL 99');
    await expect(session.command('VAL 1')).rejects.toMatchObject({
      queued: [{ code: -113 }, { code: -222 }],
    });
    await session.command('VAL 2');
  });
});

describe('ScpiSession', () => {
  it('sends the opening commands before anything else, and again after a replug', async () => {
    await open({ opening: ['SYST:REM'] });
    await session.queryNumber('READ?');
    await session.queryNumber('READ?');
    expect(device.heard).toEqual(['remote']);
    port.setPlugged(false);
    await clock.sleep(100);
    port.setPlugged(true);
    await clock.sleep(500);
    await session.queryNumber('READ?');
    expect(device.heard).toEqual(['remote', 'remote']);
  });

  it('sends nothing before all opening commands are through, however many ask at once', async () => {
    await open({ opening: ['SYST:REM', 'VAL 7'] });
    await Promise.all([session.command('VAL 1'), session.command('VAL 2')]);
    expect(device.heard).toEqual(['remote', 'value 7', 'value 1', 'value 2']);
  });

  it('asks once more after a garbled answer, and gives up after the second', async () => {
    await session.queryNumber('READ?');
    device.spoil({ kind: 'garbled', count: 1 });
    expect(await session.queryNumber('READ?')).toBeCloseTo(9.01234567, 8);
    device.reading = 'ready';
    await expect(session.queryNumber('READ?')).rejects.toMatchObject({ code: 'instrument-garbled' });
    device.reading = '9.5';
    expect(await session.queryNumber('READ?')).toBe(9.5);
  });

  it.each(['9.9E37', '-9.9E37', '+9.91000000E+37'])('takes %s for no reading', async (text) => {
    device.reading = text;
    await expect(session.queryNumber('READ?')).rejects.toMatchObject({ code: 'reading-invalid' });
  });

  it('passes on a timeout and works again afterwards', async () => {
    await session.queryNumber('READ?');
    device.spoil({ kind: 'silent', count: 1 });
    await expect(session.queryNumber('READ?')).rejects.toMatchObject({ code: 'instrument-timeout' });
    device.reading = '4.5';
    expect(await session.queryNumber('READ?')).toBe(4.5);
  });

  it('finds the error of a message whose parser gave up before the question', async () => {
    await session.queryNumber('READ?');
    await session.link.send('NONSENSE');
    device.spoil({ kind: 'silent', count: 1 });
    await expect(session.command('VAL 1')).rejects.toMatchObject({ code: 'instrument-timeout' });
    // The silent answer took the entry with it; a queue that still holds one is told instead.
    await session.link.send('NONSENSE');
    await session.link.send('NONSENSE');
    device.spoil({ kind: 'silent', count: 1 });
    await expect(session.command('VAL 1')).rejects.toMatchObject({
      code: 'instrument-error',
      queued: [{ code: -113 }],
    });
  });

  it('keeps the first errors of an overflowing queue and ends it with -350', async () => {
    for (let i = 0; i < 30; i++) await session.link.send('NONSENSE');
    const errors = await session.readErrors();
    expect(errors).toHaveLength(20);
    expect(errors[18]).toMatchObject({ code: -113 });
    expect(errors[19]).toEqual({ code: -350, message: 'Queue overflow' });
  });
});

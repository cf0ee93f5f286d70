import { beforeEach, describe, expect, it } from 'vitest';
import { VirtualClock } from '@/stations/clock/virtual-clock';
import { SerialLink, type LinkState } from '@/stations/link/serial-link';
import { scpiSync, scpiSyncByLines } from '@/stations/scpi/scpi-sync';
import { ScpiInstrument, type CommandTable } from '@/stations/simulation/scpi-instrument';
import { SimulatedPort } from '@/stations/simulation/simulated-binding';

class Counter extends ScpiInstrument {
  private count = 0;
  protected override readonly commands: CommandTable = {
    'COUNt?': () => String(++this.count),
    'ECHO?': ([text]) => text ?? '',
    'SLOW?': () => ({ afterMs: 300, answer: () => 'slow' }),
  };
}

let clock: VirtualClock;
let instrument: Counter;
let port: SimulatedPort;
let link: SerialLink;

async function openLink(sync = scpiSync): Promise<void> {
  clock = new VirtualClock();
  instrument = new Counter(clock, 'MAKER,COUNTER,1,1');
  port = new SimulatedPort(instrument);
  link = new SerialLink({
    instrument: 'meter',
    path: port.path,
    binding: port.binding,
    baudRate: 9600,
    clock,
    sync,
    terminator: '\n',
    reopenDelaysMs: [100, 100, 100],
  });
  await link.open();
}

beforeEach(() => openLink());

describe('SerialLink', () => {
  it('sends one command at a time, in the order they were asked', async () => {
    const answers = await Promise.all([
      link.exchange('SLOW?', 1000),
      link.exchange('COUN?', 1000),
      link.exchange('ECHO? b', 1000),
    ]);
    expect(answers).toEqual(['slow', '1', 'b']);
  });

  it('takes the time of ten bits a byte at the baud rate', async () => {
    await link.exchange('ECHO? a', 1000);
    const before = clock.now();
    await link.exchange('ECHO? 12345678901234567890', 1000);
    const bytes = 'ECHO? 12345678901234567890\n'.length + '12345678901234567890\n'.length;
    expect(clock.now() - before).toBeGreaterThan((bytes * 10_000) / 9600);
    expect(clock.now() - before).toBeLessThan((bytes * 10_000) / 9600 + 2);
  });

  it('gives up at the deadline with instrument-timeout and works again afterwards', async () => {
    await link.exchange('COUN?', 1000);
    instrument.spoil({ kind: 'silent', count: 1 });
    const before = clock.now();
    await expect(link.exchange('COUN?', 500)).rejects.toMatchObject({
      code: 'instrument-timeout',
      instrument: 'meter',
    });
    expect(clock.now() - before).toBe(500);
    expect(await link.exchange('COUN?', 500)).toBe('3');
  });

  it('reports bytes that are no text as instrument-garbled and synchronises before the next command', async () => {
    await link.exchange('COUN?', 1000);
    instrument.spoil({ kind: 'garbled', count: 1 });
    await expect(link.exchange('ECHO? abcdef', 500)).rejects.toMatchObject({ code: 'instrument-garbled' });
    expect(await link.exchange('ECHO? ok', 500)).toBe('ok');
  });

  it('discards what comes unasked', async () => {
    await link.exchange('COUN?', 1000);
    instrument.babble(Buffer.from('999\n77'));
    await clock.sleep(10);
    expect(await link.exchange('ECHO? mine', 500)).toBe('mine');
  });

  it('discards half an answer left from a broken one', async () => {
    await link.exchange('COUN?', 1000);
    instrument.spoil({ kind: 'cut-short', count: 1 });
    await expect(link.exchange('ECHO? abcdef', 500)).rejects.toMatchObject({ code: 'instrument-timeout' });
    expect(await link.exchange('ECHO? whole', 500)).toBe('whole');
  });

  it('never puts the rest of a late line in front of, or for, an answer', async () => {
    await link.exchange('COUN?', 1000);
    instrument.babble(Buffer.from('+1.2345'));
    await clock.sleep(10);
    clock.after(1, () => instrument.babble(Buffer.from('678E+00\n')));
    expect(await link.exchange('ECHO? mine', 500)).toBe('mine');
  });

  it('fails the outstanding command with link-lost as soon as the cable is pulled', async () => {
    await link.exchange('COUN?', 1000);
    const asked = link.exchange('SLOW?', 5000);
    clock.after(50, () => port.setPlugged(false));
    const before = clock.now();
    await expect(asked).rejects.toMatchObject({ code: 'link-lost' });
    expect(clock.now() - before).toBe(50);
    await expect(link.exchange('COUN?', 1000)).rejects.toMatchObject({ code: 'link-lost' });
  });

  it('reopens when the cable comes back in time', async () => {
    const states: LinkState[] = [];
    link.watch((state) => states.push(state));
    port.setPlugged(false);
    await clock.sleep(150);
    port.setPlugged(true);
    await clock.sleep(100);
    expect(states).toEqual(['reopening', 'open']);
    expect(await link.exchange('ECHO? back', 1000)).toBe('back');
  });

  it('gives up reopening after its last attempt, until asked to open', async () => {
    port.setPlugged(false);
    await clock.sleep(400);
    expect(link.state).toBe('lost');
    port.setPlugged(true);
    await clock.sleep(5000);
    expect(link.state).toBe('lost');
    await link.open();
    expect(await link.exchange('ECHO? again', 1000)).toBe('again');
  });

  it('is closed for good by close, outstanding command included', async () => {
    await link.exchange('COUN?', 1000);
    const asked = link.exchange('SLOW?', 5000).catch((error: { code: string }) => error.code);
    await clock.sleep(20);
    await link.close();
    expect(await asked).toBe('link-closed');
    await expect(link.exchange('COUN?', 1000)).rejects.toMatchObject({ code: 'link-closed' });
    await clock.sleep(1000);
    expect(link.state).toBe('closed');
  });
});

describe.each([
  ['one message', scpiSync],
  ['line by line', scpiSyncByLines],
])('SerialLink synchronising by %s', (_name, sync) => {
  beforeEach(() => openLink(sync));

  it.each([120, 480, 700, 900, 1500, 2400, 3600])(
    'never takes an answer that is %i ms late for the answer to another command',
    async (lateMs) => {
      await link.exchange('COUN?', 1000);
      instrument.spoil({ kind: 'late', count: 1, lateMs });
      await link.exchange('COUN?', 100).catch(() => undefined);
      while (clock.now() < lateMs + 2000) {
        const text = `x${Math.round(clock.now())}`;
        const answer = await link.exchange(`ECHO? ${text}`, 400).catch((error: { code: string }) => error.code);
        expect([text, 'instrument-timeout']).toContain(answer);
      }
      expect(await link.exchange('ECHO? end', 400)).toBe('end');
    },
  );

  it('never takes the late answer to a synchronisation for the answer to a later one', async () => {
    await link.exchange('COUN?', 1000);
    instrument.spoil({ kind: 'late', count: 3, lateMs: 1600 });
    await link.exchange('COUN?', 100).catch(() => undefined);
    await link.exchange('COUN?', 100).catch(() => undefined);
    for (let i = 0; i < 10; i++) {
      const answer = await link.exchange(`ECHO? y${i}`, 300).catch((error: { code: string }) => error.code);
      expect([`y${i}`, 'instrument-timeout']).toContain(answer);
    }
  });
});

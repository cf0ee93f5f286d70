import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { VirtualClock } from '@/stations/clock/virtual-clock';
import { isInstrumentError } from '@/stations/instruments/instrument-error';
import { SerialLink } from '@/stations/link/serial-link';
import { scpiSync, scpiSyncByLines } from '@/stations/scpi/scpi-sync';
import { ScpiInstrument, type CommandTable } from '@/stations/simulation/scpi-instrument';
import { SimulatedPort } from '@/stations/simulation/simulated-binding';

class Echo extends ScpiInstrument {
  protected override readonly commands: CommandTable = { 'ECHO?': ([text]) => text ?? '' };
}

const trouble = fc.oneof(
  fc.record({ kind: fc.constantFrom('silent', 'garbled', 'cut-short'), count: fc.integer({ min: 1, max: 3 }) }),
  fc.record({
    kind: fc.constant('late'),
    count: fc.integer({ min: 1, max: 3 }),
    lateMs: fc.integer({ min: 1, max: 2500 }),
  }),
  fc.record({ kind: fc.constant('babble'), bytes: fc.uint8Array({ minLength: 1, maxLength: 12 }) }),
  fc.record({ kind: fc.constant('unplug'), forMs: fc.integer({ min: 1, max: 900 }) }),
  fc.constant({ kind: 'none' }),
);
const episodes = fc.array(fc.tuple(trouble, fc.integer({ min: 0, max: 400 })), { minLength: 1, maxLength: 10 });

describe('SerialLink under any sequence of troubles', () => {
  it.each([
    ['one message', scpiSync],
    ['line by line', scpiSyncByLines],
  ])('answers each command with its own answer or a typed error, and recovers (%s)', async (_name, sync) => {
    await fc.assert(
      fc.asyncProperty(episodes, async (troubles) => {
        const clock = new VirtualClock();
        const instrument = new Echo(clock, 'MAKER,ECHO,1,1');
        const port = new SimulatedPort(instrument);
        const { path, binding } = port;
        const link = new SerialLink({
          instrument: 'meter',
          path,
          binding,
          baudRate: 115_200,
          clock,
          sync,
          terminator: '\n',
        });
        await link.open();
        let asked = 0;
        const ask = async () => {
          const text = `x${++asked}`;
          try {
            expect(await link.exchange(`ECHO? ${text}`, 300)).toBe(text);
          } catch (error) {
            if (!isInstrumentError(error)) throw error;
          }
        };
        for (const [happens, pauseMs] of troubles) {
          if ('bytes' in happens) {
            // Amid an exchange a whole printable line could not be told from the answer; a disturbed idle line can.
            instrument.babble(Buffer.from(happens.bytes));
            await clock.sleep(1);
          } else if ('forMs' in happens) {
            port.setPlugged(false);
            clock.after(happens.forMs, () => port.setPlugged(true));
          } else if ('count' in happens) instrument.spoil(happens as Parameters<Echo['spoil']>[0]);
          await ask();
          await clock.sleep(pauseMs);
          await ask();
        }
        instrument.spoil(null);
        await clock.sleep(15_000);
        expect(link.state).toBe('open');
        expect(await link.exchange('ECHO? recovered', 300)).toBe('recovered');
        await link.close();
      }),
      { numRuns: 150 },
    );
  });
});

import type { Clock } from '../clock/clock';
import { fill, type MeterCommandSet } from '../scpi/command-set';
import type { ScpiSession } from '../scpi/scpi-session';
import type { Channel, Multimeter } from './multimeter';

/** The longest power-line period, 50 Hz. */
const cycleMs = 20;

/** A multimeter with scanner by its command set. Remembers the closed relay and the integration time, to send them once. */
export class ScpiMultimeter implements Multimeter {
  private closed: Channel | null = null;
  private cycles: number | null = null;
  private turn: Promise<unknown> = Promise.resolve();

  constructor(
    private readonly session: ScpiSession,
    private readonly commands: MeterCommandSet,
    private readonly clock: Clock,
  ) {
    session.link.watch(() => this.forget());
  }

  identify(): Promise<string> {
    return this.session.query(this.commands.identify);
  }

  async prepare(): Promise<void> {
    const { clear, reset, complete, configure } = this.commands;
    this.forget();
    await this.session.command(clear);
    await this.session.command(reset);
    await this.session.query(complete);
    await this.session.command(configure);
  }

  /** Readings take turns: a relay closed for one must not move before it is read. */
  readVolts(channel: Channel, integrationCycles: number): Promise<number> {
    const reading = this.turn.then(() => this.read(channel, integrationCycles));
    this.turn = reading.catch(() => undefined);
    return reading;
  }

  private async read(channel: Channel, integrationCycles: number): Promise<number> {
    const { setIntegrationCycles, closeChannel, relaySettleMs, read } = this.commands;
    try {
      if (this.cycles !== integrationCycles) {
        await this.session.command(fill(setIntegrationCycles, integrationCycles));
        this.cycles = integrationCycles;
      }
      if (this.closed !== channel) {
        this.closed = null;
        await this.session.command(fill(closeChannel, channel));
        await this.clock.sleep(relaySettleMs);
        this.closed = channel;
      }
      // Some meters measure zero before each reading, which doubles the time.
      return await this.session.queryNumber(read, 2 * integrationCycles * cycleMs);
    } catch (error) {
      this.forget();
      throw error;
    }
  }

  readErrors() {
    return this.session.readErrors();
  }

  private forget(): void {
    this.closed = null;
    this.cycles = null;
  }
}

import { formatNr2 } from '@/lib/scpi/number';
import { fill, type SupplyCommandSet } from '../scpi/command-set';
import type { ScpiSession } from '../scpi/scpi-session';
import type { Supply } from './supply';

/** A supply by its command set. */
export class ScpiSupply implements Supply {
  constructor(
    private readonly session: ScpiSession,
    private readonly commands: SupplyCommandSet,
  ) {}

  identify(): Promise<string> {
    return this.session.query(this.commands.identify);
  }

  async prepare(limits: { currentLimitAmps: number; overvoltageVolts: number }): Promise<void> {
    const { clear, reset, complete, switchOff, setAmps, setOvervoltage } = this.commands;
    // First of all, whatever the reset below does.
    await this.session.link.send(switchOff);
    await this.session.command(clear);
    await this.session.command(reset);
    await this.session.query(complete);
    await this.session.command(switchOff);
    await this.session.command(fill(setAmps, formatNr2(limits.currentLimitAmps, 4)));
    await this.session.command(fill(setOvervoltage, formatNr2(limits.overvoltageVolts, 3)));
  }

  setVolts(volts: number): Promise<void> {
    return this.session.command(fill(this.commands.setVolts, formatNr2(volts, 4)));
  }

  switchOn(): Promise<void> {
    return this.session.command(this.commands.switchOn);
  }

  switchOff(): Promise<void> {
    return this.session.link.send(this.commands.switchOff);
  }

  measureVolts(): Promise<number> {
    return this.session.queryNumber(this.commands.measureVolts);
  }

  measureAmps(): Promise<number> {
    return this.session.queryNumber(this.commands.measureAmps);
  }

  async overvoltageTripped(): Promise<boolean> {
    return (await this.session.queryNumber(this.commands.overvoltageTripped)) !== 0;
  }

  clearOvervoltage(): Promise<void> {
    return this.session.command(this.commands.clearOvervoltage);
  }

  readErrors() {
    return this.session.readErrors();
  }
}

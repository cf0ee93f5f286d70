import { fill, type ControllerCommandSet } from '../scpi/command-set';
import type { ScpiSession } from '../scpi/scpi-session';
import type { FixtureController } from './fixture-controller';

/** A fixture controller by its command set. */
export class ScpiFixtureController implements FixtureController {
  constructor(
    private readonly session: ScpiSession,
    private readonly commands: ControllerCommandSet,
  ) {}

  identify(): Promise<string> {
    return this.session.query(this.commands.identify);
  }

  async lidClosed(): Promise<boolean> {
    return (await this.session.queryNumber(this.commands.lidClosed)) !== 0;
  }

  async boardPresent(): Promise<boolean> {
    return (await this.session.queryNumber(this.commands.boardPresent)) !== 0;
  }

  async interruptSupply(seconds: number): Promise<number> {
    const { setPulseSeconds, trigger, achievedSeconds } = this.commands;
    await this.session.command(fill(setPulseSeconds, seconds.toFixed(6)));
    await this.session.command(trigger);
    return this.session.queryNumber(achievedSeconds, seconds * 1000);
  }

  readErrors() {
    return this.session.readErrors();
  }
}

import { formatNr2 } from '@/lib/scpi/number';
import type { Clock } from '../clock/clock';
import type { FixtureController } from '../instruments/fixture-controller';
import type { Channel, Multimeter } from '../instruments/multimeter';
import type { Supply } from '../instruments/supply';
import {
  defaultCommandSet,
  fill,
  knownCommandSets,
  type ControllerCommandSet,
  type MeterCommandSet,
  type SupplyCommandSet,
} from '../scpi/command-set';
import type { ControllerModel } from '../simulation/controller-model';
import type { MeterModel } from '../simulation/meter-model';
import { controllerDigits } from '../simulation/simulated-controller';
import { meterDigits } from '../simulation/simulated-multimeter';
import { supplyDigits } from '../simulation/simulated-supply';
import { measureMs, type SupplyModel } from '../simulation/supply-model';
import { ModelLine } from './model-line';
import { ModelSession } from './model-session';

/** The words give the messages their length; see ScpiSupply and its siblings, whose order of commands these keep. */
const supplyWords: SupplyCommandSet = knownCommandSets.supply[defaultCommandSet]!;
const meterWords: MeterCommandSet = knownCommandSets.meter[defaultCommandSet]!;
const controllerWords: ControllerCommandSet = knownCommandSets.controller[defaultCommandSet]!;

const noErrors = async () => [];
const identity = async () => 'SILLWRIGHT,MODEL,0,1.0';

/** A simulated supply reached without bytes. */
export class ModelSupply implements Supply {
  readonly identify = identity;
  readonly readErrors = noErrors;
  private readonly session: ModelSession;

  constructor(
    clock: Clock,
    baudRate: number,
    private readonly model: SupplyModel,
  ) {
    this.session = new ModelSession('supply', new ModelLine(clock, baudRate), supplyWords.nextError);
  }

  async prepare(limits: { currentLimitAmps: number; overvoltageVolts: number }): Promise<void> {
    const { session, model } = this;
    const { clear, reset, complete, setAmps, setOvervoltage, switchOff } = supplyWords;
    const amps = formatNr2(limits.currentLimitAmps, 4);
    const volts = formatNr2(limits.overvoltageVolts, 3);
    await this.switchOff();
    await session.command(clear, () => undefined);
    await session.command(reset, () => model.reset());
    await session.flag(complete, () => true);
    await session.command(switchOff, () => model.fixture.switchOff());
    await session.command(fill(setAmps, amps), () => model.setCurrentLimit(Number(amps)));
    await session.command(fill(setOvervoltage, volts), () => model.setOvervoltage(Number(volts)));
  }

  setVolts(volts: number): Promise<void> {
    const text = formatNr2(volts, 4);
    return this.session.command(fill(supplyWords.setVolts, text), () => this.model.setVolts(Number(text)));
  }

  switchOn(): Promise<void> {
    return this.session.command(supplyWords.switchOn, () => (this.model.fixture.switchOn() ? undefined : -221));
  }

  switchOff(): Promise<void> {
    return this.session.send(supplyWords.switchOff, () => this.model.fixture.switchOff());
  }

  measureVolts(): Promise<number> {
    return this.session.reading(supplyWords.measureVolts, supplyDigits, () => this.model.readVolts(), measuring);
  }

  measureAmps(): Promise<number> {
    return this.session.reading(supplyWords.measureAmps, supplyDigits, () => this.model.readAmps(), measuring);
  }

  overvoltageTripped(): Promise<boolean> {
    return this.session.flag(supplyWords.overvoltageTripped, () => this.model.fixture.overvoltageTripped);
  }

  clearOvervoltage(): Promise<void> {
    return this.session.command(supplyWords.clearOvervoltage, () => this.model.fixture.clearOvervoltage());
  }
}

const measuring = () => measureMs;

/** A simulated multimeter reached without bytes. Remembers relay and integration time, as ScpiMultimeter does. */
export class ModelMultimeter implements Multimeter {
  readonly identify = identity;
  readonly readErrors = noErrors;
  private closed: Channel | null = null;
  private cycles: number | null = null;
  private turn: Promise<unknown> = Promise.resolve();
  private readonly session: ModelSession;

  constructor(
    private readonly clock: Clock,
    baudRate: number,
    private readonly model: MeterModel,
  ) {
    this.session = new ModelSession('meter', new ModelLine(clock, baudRate), meterWords.nextError);
  }

  async prepare(): Promise<void> {
    const { session, model } = this;
    this.closed = null;
    this.cycles = null;
    await session.command(meterWords.clear, () => undefined);
    await session.command(meterWords.reset, () => model.reset());
    await session.flag(meterWords.complete, () => true);
    await session.command(meterWords.configure, () => model.configure());
  }

  readVolts(channel: Channel, integrationCycles: number): Promise<number> {
    const reading = this.turn.then(() => this.read(channel, integrationCycles));
    this.turn = reading.catch(() => undefined);
    return reading;
  }

  private async read(channel: Channel, integrationCycles: number): Promise<number> {
    const { session, model } = this;
    const { setIntegrationCycles, closeChannel, relaySettleMs, read } = meterWords;
    if (this.cycles !== integrationCycles) {
      await session.command(fill(setIntegrationCycles, integrationCycles), () => {
        model.cycles = integrationCycles;
      });
      this.cycles = integrationCycles;
    }
    if (this.closed !== channel) {
      this.closed = null;
      await session.command(fill(closeChannel, channel), () =>
        model.channels.includes(channel) ? model.closeChannel(channel) : -222,
      );
      await this.clock.sleep(relaySettleMs);
      this.closed = channel;
    }
    return session.reading(
      read,
      meterDigits,
      (fromMs) => model.integrate(fromMs),
      () => model.windowMs,
    );
  }
}

/** A simulated fixture controller reached without bytes. */
export class ModelController implements FixtureController {
  readonly identify = identity;
  readonly readErrors = noErrors;
  private readonly session: ModelSession;

  constructor(
    clock: Clock,
    baudRate: number,
    private readonly model: ControllerModel,
  ) {
    this.session = new ModelSession('controller', new ModelLine(clock, baudRate), controllerWords.nextError);
  }

  lidClosed(): Promise<boolean> {
    return this.session.flag(controllerWords.lidClosed, () => this.model.fixture.lidClosed);
  }

  boardPresent(): Promise<boolean> {
    return this.session.flag(controllerWords.boardPresent, () => this.model.fixture.seated !== null);
  }

  async interruptSupply(seconds: number): Promise<number> {
    const { session, model } = this;
    const text = seconds.toFixed(6);
    await session.command(fill(controllerWords.setPulseSeconds, text), () => {
      model.widthSeconds = Number(text);
    });
    await session.command(controllerWords.trigger, () => model.trigger());
    return session.reading(
      controllerWords.achievedSeconds,
      controllerDigits,
      () => model.achievedSeconds!,
      () => model.leftMs,
    );
  }
}

import { formatNr2 } from '@/lib/scpi/number';
import type { Channel } from '../instruments/multimeter';
import { safeBelowVolts, type SafeOffReport } from '../instruments/safe-off';
import { defaultCommandSet, fill, knownCommandSets } from '../scpi/command-set';
import type { ControllerModel } from '../simulation/controller-model';
import type { MeterModel } from '../simulation/meter-model';
import { modelBench, type SimulatedBenchOptions } from '../simulation/simulated-bench';
import { controllerDigits } from '../simulation/simulated-controller';
import type { SimulatedFixture } from '../simulation/simulated-fixture';
import { meterDigits } from '../simulation/simulated-multimeter';
import { supplyDigits } from '../simulation/simulated-supply';
import { measureMs, type SupplyModel } from '../simulation/supply-model';
import type { DryClock } from './dry-clock';
import { DryLine } from './dry-line';

/** The words give the messages their length. */
const supplyWords = knownCommandSets.supply[defaultCommandSet]!;
const meterWords = knownCommandSets.meter[defaultCommandSet]!;
const controllerWords = knownCommandSets.controller[defaultCommandSet]!;

/** A simulated supply called at once; what ScpiSupply does, command by command. */
export class DrySupply {
  constructor(
    private readonly line: DryLine,
    private readonly model: SupplyModel,
  ) {}

  prepare(limits: { currentLimitAmps: number; overvoltageVolts: number }): void {
    const { line, model } = this;
    const { clear, reset, complete, setAmps, setOvervoltage, switchOff } = supplyWords;
    const amps = formatNr2(limits.currentLimitAmps, 4);
    const volts = formatNr2(limits.overvoltageVolts, 3);
    this.switchOff();
    line.command(clear, () => undefined);
    line.command(reset, () => model.reset());
    line.flag(complete, () => true);
    line.command(switchOff, () => model.fixture.switchOff());
    line.command(fill(setAmps, amps), () => model.setCurrentLimit(Number(amps)));
    line.command(fill(setOvervoltage, volts), () => model.setOvervoltage(Number(volts)));
  }

  setVolts(volts: number): void {
    const text = formatNr2(volts, 4);
    this.line.command(fill(supplyWords.setVolts, text), () => this.model.setVolts(Number(text)));
  }

  switchOn(): void {
    this.line.command(supplyWords.switchOn, () => (this.model.fixture.switchOn() ? undefined : -221));
  }

  switchOff(): void {
    this.line.send(supplyWords.switchOff, () => this.model.fixture.switchOff());
  }

  measureVolts(): number {
    return this.line.reading(supplyWords.measureVolts, supplyDigits, measureMs, () => this.model.readVolts());
  }

  beginMeasuringVolts() {
    return this.line.beginReading(supplyWords.measureVolts, supplyDigits, measureMs, () => this.model.readVolts());
  }

  measureAmps(): number {
    return this.line.reading(supplyWords.measureAmps, supplyDigits, measureMs, () => this.model.readAmps());
  }

  overvoltageTripped(): boolean {
    return this.line.flag(supplyWords.overvoltageTripped, () => this.model.fixture.overvoltageTripped);
  }
}

/** A simulated multimeter called at once; remembers relay and integration time, as ScpiMultimeter does. */
export class DryMeter {
  private closed: Channel | null = null;
  private cycles: number | null = null;

  constructor(
    private readonly clock: DryClock,
    private readonly line: DryLine,
    private readonly model: MeterModel,
  ) {}

  prepare(): void {
    const { line, model } = this;
    this.closed = null;
    this.cycles = null;
    line.command(meterWords.clear, () => undefined);
    line.command(meterWords.reset, () => model.reset());
    line.flag(meterWords.complete, () => true);
    line.command(meterWords.configure, () => model.configure());
  }

  readVolts(channel: Channel, integrationCycles: number): number {
    const { line, model, clock } = this;
    const { setIntegrationCycles, closeChannel, relaySettleMs, read } = meterWords;
    if (this.cycles !== integrationCycles) {
      line.command(fill(setIntegrationCycles, integrationCycles), () => {
        model.cycles = integrationCycles;
      });
      this.cycles = integrationCycles;
    }
    if (this.closed !== channel) {
      this.closed = null;
      line.command(fill(closeChannel, channel), () =>
        model.channels.includes(channel) ? model.closeChannel(channel) : -222,
      );
      clock.advanceTo(clock.now() + relaySettleMs);
      this.closed = channel;
    }
    return line.reading(read, meterDigits, model.windowMs, (fromMs) => model.integrate(fromMs));
  }
}

/** A simulated fixture controller called at once. */
export class DryController {
  constructor(
    private readonly line: DryLine,
    private readonly model: ControllerModel,
  ) {}

  lidClosed(): boolean {
    return this.line.flag(controllerWords.lidClosed, () => this.model.fixture.lidClosed);
  }

  boardPresent(): boolean {
    return this.line.flag(controllerWords.boardPresent, () => this.model.fixture.seated !== null);
  }

  interruptSupply(seconds: number): number {
    const { line, model } = this;
    const text = seconds.toFixed(6);
    line.command(fill(controllerWords.setPulseSeconds, text), () => {
      model.widthSeconds = Number(text);
    });
    line.command(controllerWords.trigger, () => model.trigger());
    const left = () => model.leftMs;
    return line.reading(controllerWords.achievedSeconds, controllerDigits, left, () => model.achievedSeconds!);
  }
}

export interface DryBench {
  clock: DryClock;
  fixture: SimulatedFixture;
  supply: DrySupply;
  meter: DryMeter;
  controller: DryController | null;
}

/**
 * A simulated bench whose instruments are called, not written to. It takes the time and gives the values of the bench with
 * bytes (a test compares them), and answers always: links that fail belong to the bench with bytes.
 */
export function openDryBench(options: SimulatedBenchOptions & { clock: DryClock; baudRate: number }): DryBench {
  const { clock, baudRate } = options;
  const models = modelBench(options);
  const line = (instrument: 'supply' | 'meter' | 'controller', { nextError }: { nextError: string }) =>
    new DryLine(instrument, clock, baudRate, nextError);
  return {
    clock,
    fixture: models.fixture,
    supply: new DrySupply(line('supply', supplyWords), models.supply),
    meter: new DryMeter(clock, line('meter', meterWords), models.meter),
    controller: models.controller && new DryController(line('controller', controllerWords), models.controller),
  };
}

const pauseMs = 50;
const patienceMs = 4_000;

/** As `safeOff` of stations/instruments: off, then both read back below 2 V. */
export function safeOffNow({ clock, supply, meter }: DryBench): SafeOffReport {
  const giveUpAt = clock.now() + patienceMs;
  for (;;) {
    supply.switchOff();
    const bySupply = supply.beginMeasuringVolts();
    const volts = meter.readVolts(101, 1);
    clock.advanceTo(bySupply.doneAtMs());
    if (Math.abs(volts) < safeBelowVolts && Math.abs(bySupply.value()) < safeBelowVolts)
      return { confirmed: true, volts, by: 'meter' };
    if (clock.now() >= giveUpAt) return { confirmed: false };
    clock.advanceTo(clock.now() + pauseMs);
  }
}

import type { OutputSensing } from '@/lib/contracts/board-type';
import type { OutputState } from '@/lib/search/types';
import { overvoltageFault } from '../run/fault-of';
import { stateCycles, valueCycles } from '../run/integration';
import { required, shortfallVolts, type Answer, type Effect } from '../run/perform-effect';
import { safeOffNow, type DryBench } from './dry-bench';

/** Thrown inside an effect whose place a later one has taken: nothing more is sent. */
export class Superseded extends Error {}

/**
 * `performEffect` without awaiting, command for command; a test compares their answers. `isSuperseded` is asked after each
 * command and wakes a sleep.
 */
export function performNow(
  effect: Effect,
  bench: DryBench,
  sensing: OutputSensing,
  isSuperseded: () => boolean,
): Answer {
  const { clock, supply, meter } = bench;
  const { id } = effect;
  const step = <T>(value: T): T => {
    if (isSuperseded()) throw new Superseded();
    return value;
  };
  const sleep = (ms: number) => step(clock.advanceTo(clock.now() + ms, isSuperseded));
  const readOutput = (): OutputState => {
    const on =
      sensing.kind === 'output-voltage'
        ? meter.readVolts(102, stateCycles) > sensing.thresholdVolts
        : supply.measureAmps() > sensing.thresholdAmps;
    return on ? 'on' : 'off';
  };
  /** See `refuseTripped` of perform-effect. */
  const refuseTripped = (commandedVolts: number, volts: number) => {
    if (volts > commandedVolts - shortfallVolts) return;
    if (supply.overvoltageTripped()) throw overvoltageFault(commandedVolts);
  };
  switch (effect.kind) {
    case 'read-fixture': {
      const controller = required(bench.controller);
      const lidClosed = step(controller.lidClosed());
      const boardPresent = step(controller.boardPresent());
      return { kind: 'fixture-read', id, lidClosed, boardPresent };
    }
    case 'prepare-supply':
      step(supply.prepare(effect));
      step(meter.prepare());
      return { kind: 'prepared', id };
    case 'supply-on': {
      step(supply.setVolts(effect.volts));
      step(supply.switchOn());
      sleep(effect.settleMs);
      const volts = step(meter.readVolts(101, valueCycles));
      const amps = step(supply.measureAmps());
      refuseTripped(effect.volts, volts);
      return { kind: 'supply-is-on', id, volts, amps };
    }
    case 'probe': {
      const voltsBefore = effect.readBefore ? step(meter.readVolts(101, valueCycles)) : null;
      step(supply.setVolts(effect.volts));
      sleep(effect.dwellMs);
      const volts = step(meter.readVolts(101, valueCycles));
      const output = step(readOutput());
      refuseTripped(effect.volts, volts);
      return { kind: 'probed', id, voltsBefore, volts, output };
    }
    case 'sense':
      return { kind: 'sensed', id, output: readOutput() };
    case 'measure':
      return { kind: 'measured', id, volts: meter.readVolts(effect.channel, effect.integrationCycles) };
    case 'measure-supply': {
      const volts = step(supply.measureVolts());
      return { kind: 'supply-measured', id, volts, amps: supply.measureAmps() };
    }
    case 'measure-wiper': {
      const wiperVolts = step(meter.readVolts(104, stateCycles));
      const supplyVolts = step(meter.readVolts(101, stateCycles));
      return { kind: 'wiper-measured', id, wiperVolts, supplyVolts };
    }
    case 'pulse':
      return { kind: 'pulsed', id, seconds: required(bench.controller).interruptSupply(effect.seconds) };
    case 'wait':
      sleep(effect.milliseconds);
      return { kind: 'waited', id };
    case 'supply-off':
      return { kind: 'supply-is-off', id, ...safeOffNow(bench) };
  }
}

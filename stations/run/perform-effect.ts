import type { OutputSensing } from '@/lib/contracts/board-type';
import type { BenchReading } from '@/lib/contracts/bench-view';
import type { OutputState } from '@/lib/search/types';
import type { RunEffect, RunEvent } from '@/lib/run/types';
import type { Clock } from '../clock/clock';
import { OutputSensor } from '../instruments/output-sensor';
import type { Bench } from '../instruments/open-bench';
import { stateCycles, valueCycles } from './integration';
import { overvoltageFault, StationFault } from './fault-of';

export interface Performing {
  bench: Bench;
  clock: Clock;
  sensing: OutputSensing;
  /** Aborted when a later effect takes this one's place: nothing more is sent. */
  signal: AbortSignal;
  onReading(reading: BenchReading): void;
}

type Unstamped<E> = E extends unknown ? Omit<E, 'atMs'> : never;
export type Answer = Unstamped<Extract<RunEvent, { id: number }>>;
export type Effect = Exclude<RunEffect, { kind: 'record-run' }>;

/** Does one thing at the bench and says what came of it. Rejects with an instrument's or the station's own fault. */
export async function performEffect(effect: Effect, performing: Performing): Promise<Answer> {
  const { bench, clock, sensing, signal, onReading } = performing;
  const { id } = effect;
  /** Each step of an effect goes through here, so that a superseded effect sends no further command. */
  const step = async <T>(work: Promise<T>): Promise<T> => {
    const value = await work;
    signal.throwIfAborted();
    return value;
  };
  const readOutput = () => new OutputSensor(sensing, bench.supply, bench.meter).read(stateCycles);
  signal.throwIfAborted();
  switch (effect.kind) {
    case 'read-fixture': {
      const controller = required(bench.controller);
      const lidClosed = await step(controller.lidClosed());
      const boardPresent = await step(controller.boardPresent());
      return { kind: 'fixture-read', id, lidClosed, boardPresent };
    }
    case 'prepare-supply':
      await step(bench.supply.prepare(effect));
      await step(bench.meter.prepare());
      return { kind: 'prepared', id };
    case 'supply-on': {
      await step(bench.supply.setVolts(effect.volts));
      await step(bench.supply.switchOn());
      await clock.sleep(effect.settleMs, signal);
      const volts = await step(bench.meter.readVolts(101, valueCycles));
      const amps = await step(bench.supply.measureAmps());
      await refuseTripped(bench, effect.volts, volts);
      onReading(reading(volts, null));
      return { kind: 'supply-is-on', id, volts, amps };
    }
    case 'probe': {
      const voltsBefore = effect.readBefore ? await step(bench.meter.readVolts(101, valueCycles)) : null;
      await step(bench.supply.setVolts(effect.volts));
      await clock.sleep(effect.dwellMs, signal);
      const volts = await step(bench.meter.readVolts(101, valueCycles));
      const output = await step(readOutput());
      await refuseTripped(bench, effect.volts, volts);
      onReading(reading(volts, output));
      return { kind: 'probed', id, voltsBefore, volts, output };
    }
    case 'sense':
      return { kind: 'sensed', id, output: await readOutput() };
    case 'measure':
      return { kind: 'measured', id, volts: await bench.meter.readVolts(effect.channel, effect.integrationCycles) };
    case 'measure-supply': {
      const volts = await step(bench.supply.measureVolts());
      return { kind: 'supply-measured', id, volts, amps: await bench.supply.measureAmps() };
    }
    case 'measure-wiper': {
      const wiperVolts = await step(bench.meter.readVolts(104, stateCycles));
      const supplyVolts = await step(bench.meter.readVolts(101, stateCycles));
      return { kind: 'wiper-measured', id, wiperVolts, supplyVolts };
    }
    case 'pulse':
      return { kind: 'pulsed', id, seconds: await required(bench.controller).interruptSupply(effect.seconds) };
    case 'wait':
      await clock.sleep(effect.milliseconds, signal);
      return { kind: 'waited', id };
    case 'supply-off': {
      const off = await bench.safeOff();
      onReading({ volts: off.confirmed ? off.volts : 0, output: null, rail: 'off' });
      return { kind: 'supply-is-off', id, ...off };
    }
  }
}

/** Longest that an effect may take when nothing is wrong, without the instruments' own time. Milliseconds. */
export function ownDurationMs(effect: Effect): number {
  switch (effect.kind) {
    case 'supply-on':
      return effect.settleMs;
    case 'probe':
      return effect.dwellMs;
    case 'wait':
      return effect.milliseconds;
    case 'pulse':
      return effect.seconds * 1000;
    case 'measure':
      return effect.integrationCycles * 20;
    default:
      return 0;
  }
}

function reading(volts: number, output: OutputState | null): BenchReading {
  return { volts, output, rail: output === 'off' ? 'rising' : 'falling' };
}

/** A terminal voltage far below the command is asked about: a tripped protection is the station's fault, not the board's. */
async function refuseTripped({ supply }: Bench, commandedVolts: number, volts: number): Promise<void> {
  if (volts > commandedVolts - shortfallVolts) return;
  if (await supply.overvoltageTripped()) throw overvoltageFault(commandedVolts);
}
export const shortfallVolts = 0.5;

export function required<T>(controller: T | null): T {
  if (controller) return controller;
  throw new StationFault({ reason: 'fixture-fault', code: 'F-106', detail: 'This station has no fixture controller.' });
}

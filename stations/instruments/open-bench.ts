import type { StationLink } from '@/lib/contracts/station-link';
import type { Clock } from '../clock/clock';
import { realBinding, type Binding } from '../link/binding';
import { SerialLink, type LinkState } from '../link/serial-link';
import {
  defaultCommandSet,
  knownCommandSets,
  type ControllerCommandSet,
  type MeterCommandSet,
  type SupplyCommandSet,
} from '../scpi/command-set';
import { ScpiSession, type SessionWords } from '../scpi/scpi-session';
import { scpiSync, scpiSyncByLines } from '../scpi/scpi-sync';
import { simulateBench, type SimulatedBench } from '../simulation/simulated-bench';
import type { FixtureController } from './fixture-controller';
import { InstrumentError, type InstrumentName } from './instrument-error';
import type { Multimeter } from './multimeter';
import { safeOff, type SafeOffReport } from './safe-off';
import { ScpiFixtureController } from './scpi-fixture-controller';
import { ScpiMultimeter } from './scpi-multimeter';
import { ScpiSupply } from './scpi-supply';
import type { Supply } from './supply';

export interface BenchConfig {
  link: StationLink;
  hasWiperProbe: boolean;
  /** Names from `command-sets.json`; plain SCPI-1999 where none is given. */
  commandSets?: { supply?: string; meter?: string; controller?: string };
  /** The bench of an earlier opening on the same clock, so that its board and lid outlive the links; else a new one is made. */
  simulation?: SimulatedBench;
}

export interface InstrumentHealth {
  instrument: InstrumentName;
  state: LinkState;
  /** The whole answer to *IDN?; null where none came. */
  identity: string | null;
  /** Why not, in a sentence. */
  problem: string | null;
}

/** The instruments of one station with their links. */
export interface Bench {
  supply: Supply;
  meter: Multimeter;
  /** Null on a station without one. */
  controller: FixtureController | null;
  /** Null on a real station. */
  simulation: SimulatedBench | null;
  /** Asks every instrument who it is. Never throws. */
  health(): Promise<InstrumentHealth[]>;
  /** Calls back when a link is lost or comes back; returns how to stop. */
  watchLinks(watcher: (instrument: InstrumentName, state: LinkState) => void): () => void;
  /** Opens again what was lost for good or never opened. Never throws; ask `health`. */
  reopen(): Promise<void>;
  /** Supply off with read-back. Never throws. */
  safeOff(): Promise<SafeOffReport>;
  /** Closes the links and leaves the supply as it is: call `safeOff` first. */
  close(): Promise<void>;
}

interface Port {
  path: string;
  binding: Binding;
}

/**
 * Opens the links of a station. A port that cannot be opened leaves its link closed and its instrument failing with
 * `link-lost`, so that a station with a pulled cable still comes up and says which; throws only for an unknown command set.
 */
export async function openBench(config: BenchConfig, clock: Clock): Promise<Bench> {
  const { link, hasWiperProbe, commandSets = {} } = config;
  const simulation =
    link.kind === 'simulated' ? (config.simulation ?? simulateBench({ ...link, hasWiperProbe, clock })) : null;
  const ports = simulation ? simulation.ports : await serialPorts(link);

  const sessions = new Map<InstrumentName, ScpiSession>();
  const open = async (instrument: InstrumentName, port: Port, words: SessionWords) => {
    const serial = new SerialLink({
      instrument,
      path: port.path,
      binding: port.binding,
      baudRate: link.baudRate,
      clock,
      sync: words.compound ? scpiSync : scpiSyncByLines,
      terminator: words.terminator,
    });
    const session = new ScpiSession(serial, words);
    sessions.set(instrument, session);
    await serial.open().catch(() => undefined);
    return session;
  };
  const supplySet: SupplyCommandSet = named('supply', commandSets.supply);
  const meterSet: MeterCommandSet = named('meter', commandSets.meter);
  const supply = new ScpiSupply(await open('supply', ports.supply, supplySet), supplySet);
  const meter = new ScpiMultimeter(await open('meter', ports.meter, meterSet), meterSet, clock);
  let controller: FixtureController | null = null;
  if (ports.controller) {
    const controllerSet: ControllerCommandSet = named('controller', commandSets.controller);
    const session = await open('controller', ports.controller, controllerSet);
    controller = new ScpiFixtureController(session, controllerSet);
  }
  const links = [...sessions].map(([instrument, session]) => ({ instrument, link: session.link }));
  const instruments = { supply, meter, controller };

  return {
    ...instruments,
    simulation,
    health: () => Promise.all(links.map((each) => askHealth(each.instrument, each.link, instruments[each.instrument]))),
    watchLinks(watcher) {
      const stops = links.map(({ instrument, link: each }) => each.watch((state) => watcher(instrument, state)));
      return () => stops.forEach((stop) => stop());
    },
    async reopen() {
      await Promise.all(
        links.map(({ link: each }) =>
          each.state === 'lost' || each.state === 'closed' ? each.open().catch(() => undefined) : undefined,
        ),
      );
    },
    safeOff: () => safeOff(instruments, clock),
    async close() {
      await Promise.all(links.map(({ link: each }) => each.close()));
    },
  };
}

async function askHealth(
  instrument: InstrumentName,
  link: SerialLink,
  device: { identify(): Promise<string> } | null,
): Promise<InstrumentHealth> {
  const problem = (error: unknown) => (error instanceof Error ? error.message : String(error));
  try {
    return { instrument, identity: (await device?.identify()) ?? null, state: link.state, problem: null };
  } catch (error) {
    return { instrument, identity: null, state: link.state, problem: problem(error) };
  }
}

async function serialPorts(link: StationLink): Promise<{ supply: Port; meter: Port; controller: Port | null }> {
  if (link.kind !== 'serial') throw new Error('A simulated station has no serial paths.');
  const binding = await realBinding();
  const at = (path: string): Port => ({ path, binding });
  return {
    supply: at(link.supplyPath),
    meter: at(link.meterPath),
    controller: link.controllerPath === null ? null : at(link.controllerPath),
  };
}

function named<K extends InstrumentName>(
  instrument: K,
  name = defaultCommandSet,
): (typeof knownCommandSets)[K][string] {
  const set = knownCommandSets[instrument][name];
  if (!set) {
    throw new InstrumentError('instrument-error', instrument, `There is no command set ${name} for a ${instrument}.`);
  }
  return set as (typeof knownCommandSets)[K][string];
}

import type { Clock } from '../clock/clock';
import { seededRandom } from './random';
import type { ScpiInstrument } from './scpi-instrument';
import { SimulatedPort } from './simulated-binding';
import { SimulatedController } from './simulated-controller';
import { SimulatedFixture, usualFixture, type FixtureCharacter } from './simulated-fixture';
import { drawMeterCharacter, SimulatedMultimeter, type MeterCharacter } from './simulated-multimeter';
import { drawSupplyCharacter, SimulatedSupply, type SupplyCharacter } from './simulated-supply';

export interface SimulatedBenchOptions {
  clock: Clock;
  /** Fixes the station's own offsets and all its noise. */
  seed: number;
  hasController: boolean;
  hasWiperProbe: boolean;
  /** Where a study wants another plant than the seed draws. */
  fixture?: Partial<FixtureCharacter>;
  supply?: Partial<SupplyCharacter>;
  meter?: Partial<MeterCharacter>;
}

/** What stands in for a bench: a fixture with a board on it, three instruments and their cables. */
export interface SimulatedBench {
  fixture: SimulatedFixture;
  instruments: Record<'supply' | 'meter', ScpiInstrument> & { controller: ScpiInstrument | null };
  ports: Record<'supply' | 'meter', SimulatedPort> & { controller: SimulatedPort | null };
}

export function simulateBench(options: SimulatedBenchOptions): SimulatedBench {
  const { clock, seed } = options;
  const random = seededRandom(seed);
  const serialNumber = String(100_000 + (seed % 900_000));
  const fixture = new SimulatedFixture(clock, random, { ...usualFixture, ...options.fixture });
  const supply = new SimulatedSupply(
    clock,
    fixture,
    random,
    { ...drawSupplyCharacter(random), ...options.supply },
    serialNumber,
  );
  const meter = new SimulatedMultimeter(
    clock,
    fixture,
    random,
    { ...drawMeterCharacter(random, options.hasWiperProbe), ...options.meter },
    serialNumber,
  );
  const controller = options.hasController ? new SimulatedController(clock, fixture, random, serialNumber) : null;
  return {
    fixture,
    instruments: { supply, meter, controller },
    ports: {
      supply: new SimulatedPort(supply),
      meter: new SimulatedPort(meter),
      controller: controller && new SimulatedPort(controller),
    },
  };
}

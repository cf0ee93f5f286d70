import type { Clock } from '../clock/clock';
import { ControllerModel } from './controller-model';
import { drawMeterCharacter, MeterModel, type MeterCharacter } from './meter-model';
import { seededRandom } from './random';
import type { ScpiInstrument } from './scpi-instrument';
import { SimulatedPort } from './simulated-binding';
import { SimulatedController } from './simulated-controller';
import { SimulatedFixture, usualFixture, type FixtureCharacter } from './simulated-fixture';
import { SimulatedMultimeter } from './simulated-multimeter';
import { SimulatedSupply } from './simulated-supply';
import { drawSupplyCharacter, SupplyModel, type SupplyCharacter } from './supply-model';

export interface SimulatedBenchOptions {
  clock: Pick<Clock, 'now'>;
  /** Fixes the station's own offsets and all its noise. */
  seed: number;
  hasController: boolean;
  hasWiperProbe: boolean;
  /** Where a study wants another plant than the seed draws. */
  fixture?: Partial<FixtureCharacter>;
  supply?: Partial<SupplyCharacter>;
  meter?: Partial<MeterCharacter>;
}

/** A bench's physics: the fixture and what its instruments do, without their faces. */
export interface BenchModels {
  fixture: SimulatedFixture;
  supply: SupplyModel;
  meter: MeterModel;
  controller: ControllerModel | null;
  serialNumber: string;
}

/** What stands in for a bench: a fixture with a board on it, three instruments and their cables. */
export interface SimulatedBench {
  fixture: SimulatedFixture;
  instruments: Record<'supply' | 'meter', ScpiInstrument> & { controller: ScpiInstrument | null };
  ports: Record<'supply' | 'meter', SimulatedPort> & { controller: SimulatedPort | null };
}

export function modelBench(options: SimulatedBenchOptions): BenchModels {
  const { clock, seed, hasController, hasWiperProbe } = options;
  const random = seededRandom(seed);
  const fixture = new SimulatedFixture(clock, random, { ...usualFixture, ...options.fixture });
  const supply = new SupplyModel(fixture, random, { ...drawSupplyCharacter(random), ...options.supply });
  const meterCharacter = { ...drawMeterCharacter(random, hasWiperProbe), ...options.meter };
  return {
    fixture,
    supply,
    meter: new MeterModel(clock, fixture, random, meterCharacter),
    controller: hasController ? new ControllerModel(clock, fixture, random) : null,
    serialNumber: String(100_000 + (seed % 900_000)),
  };
}

export function simulateBench(options: SimulatedBenchOptions & { clock: Clock }): SimulatedBench {
  const { clock } = options;
  const { fixture, serialNumber, ...models } = modelBench(options);
  const supply = new SimulatedSupply(clock, models.supply, serialNumber);
  const meter = new SimulatedMultimeter(clock, models.meter, serialNumber);
  const controller = models.controller && new SimulatedController(clock, models.controller, serialNumber);
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

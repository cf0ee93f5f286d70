import type { Clock } from '../clock/clock';
import type { Bench } from '../instruments/open-bench';
import { safeOff } from '../instruments/safe-off';
import { modelBench, type SimulatedBenchOptions } from '../simulation/simulated-bench';
import type { SimulatedFixture } from '../simulation/simulated-fixture';
import { ModelController, ModelMultimeter, ModelSupply } from './model-instruments';

export interface ModelBench {
  bench: Bench;
  fixture: SimulatedFixture;
}

/**
 * A simulated bench whose instruments are called, not written to. It takes the time and gives the values of the bench with
 * bytes (a test compares them), and answers always: links that fail belong to the bench with bytes.
 */
export function openModelBench(options: SimulatedBenchOptions & { clock: Clock; baudRate: number }): ModelBench {
  const { clock, baudRate } = options;
  const models = modelBench(options);
  const supply = new ModelSupply(clock, baudRate, models.supply);
  const meter = new ModelMultimeter(clock, baudRate, models.meter);
  const controller = models.controller && new ModelController(clock, baudRate, models.controller);
  const bench: Bench = {
    supply,
    meter,
    controller,
    simulation: null,
    health: async () => [],
    watchLinks: () => () => undefined,
    reopen: async () => undefined,
    safeOff: () => safeOff({ supply, meter }, clock),
    close: async () => undefined,
  };
  return { bench, fixture: models.fixture };
}

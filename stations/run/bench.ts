import type { FixtureController } from '../instruments/fixture-controller';
import type { Multimeter } from '../instruments/multimeter';
import type { Supply } from '../instruments/supply';

/** The instruments of one station, opened. `controller` is null where there is none. */
export interface Instruments {
  supply: Supply;
  meter: Multimeter;
  controller: FixtureController | null;
}

/** Integration, in power-line cycles: of a value that is kept, and of one that only tells on from off. */
export const valueCycles = 1;
export const stateCycles = 0.1;

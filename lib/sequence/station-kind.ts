import type { StationLink } from '../contracts/station-link';
import type { CommissioningValues } from '../run/types';

/**
 * What the rules and the prediction take a station to be: a real one with its commissioning, or the usual one where none is
 * chosen. Milliseconds are of one exchange with the instrument, beside dwell and integration.
 */
export interface StationKind {
  hasController: boolean;
  hasWiperProbe: boolean;
  baudRate: StationLink['baudRate'];
  commissioning: CommissioningValues;
  meter: { gain: number; offsetVolts: number; resolutionVolts: number };
}

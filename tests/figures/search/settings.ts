import type { SearchSettings } from '../../../lib/search/types';
import { ranges12, ranges24 } from './population';
import type { SearchRow } from './rows';

/** Noise the estimator assumes where the plant has none. */
const leastNoiseVolts = 0.3e-3;

export function settingsOf(row: SearchRow): SearchSettings {
  return {
    ...(row.volts === 12 ? ranges12 : ranges24),
    noiseVolts: Math.max(leastNoiseVolts, row.noiseMillivolts * 1e-3),
    wantedUncertaintyVolts: row.wantedMillivolts * 1e-3,
    mostSettles: row.mostSettles,
    overshoot: row.overshoot,
    endCheck: true,
    ...(row.prior ? { prior: row.prior } : {}),
  };
}

import { type Level, type Pair, assumedMass } from './assumptions';
import type { Belief } from './belief';
import type { GridPosterior } from './grid-posterior';
import type { SearchSettings } from './types';

/** Evidence below which a level is given up. */
const leastEvidence = 0.02;

/**
 * Evidence for a level from posteriors on wide grids: without a lot prior the share of the mass that the level allows;
 * with one, four tenths of the Bayes factor of the prior against no assumption. `unseen` is the mass before any outcome.
 */
function levelEvidence(settings: SearchSettings, level: Level, wide: Pair<GridPosterior>, unseen: number): number {
  const mass = assumedMass(settings, level, wide);
  return level === 0 && settings.prior ? (0.4 * mass) / unseen : mass;
}

/**
 * The level of assumptions that the outcomes still allow: lower when they carry too little evidence, or when an
 * estimate that has become sharp lies at the edge of what is assumed (a value outside would have been pushed there).
 */
export function allowedLevel(
  settings: SearchSettings,
  level: Level,
  wide: Pair<GridPosterior>,
  beliefs: Pair<Belief>,
  unseen: number,
): Level {
  if (level === 2) return 2;
  const noise = settings.noiseVolts;
  const trip = beliefs.trip.mean;
  const hysteresis = -beliefs.release.mean - trip;
  const { sd } = beliefs.trip;
  const both = Math.hypot(sd, beliefs.release.sd);
  const prior = level === 0 ? settings.prior : undefined;

  const nearHysteresisEdge =
    hysteresis < settings.hysteresisMinVolts + 4 * (both + noise) ||
    hysteresis > settings.hysteresisMaxVolts - 4 * (both + noise);
  if (both < 0.01) {
    const farFromLot = prior && Math.abs(hysteresis - prior.hysteresisMeanVolts) > 4.5 * prior.hysteresisSdVolts;
    if (nearHysteresisEdge && !prior) return 2;
    if (farFromLot) return nearHysteresisEdge ? 2 : 1;
  }
  if (level === 0 && sd < 0.02) {
    const edge = 4 * (sd + noise);
    const atEdge = prior
      ? Math.abs(trip - prior.tripMeanVolts) > 4.2 * prior.tripSdVolts
      : trip < settings.tripMinVolts + edge || trip > settings.tripMaxVolts - edge;
    if (atEdge) return 1;
  }
  if (levelEvidence(settings, level, wide, unseen) < leastEvidence) return level === 0 ? 1 : 2;
  return level;
}

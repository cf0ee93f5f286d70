/** Shares from 0 to 1. */
export interface ShareInterval {
  low: number;
  high: number;
}

/** A count of successes among trials; throws for anything else, since such a count is a bug. */
export function checkCount(successes: number, trials: number): void {
  if (!(Number.isInteger(successes) && Number.isInteger(trials) && successes >= 0 && successes <= trials && trials > 0))
    throw new RangeError(`${successes} of ${trials} is not a count.`);
}

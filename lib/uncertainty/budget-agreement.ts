import type { Budget } from './budget';
import type { MonteCarlo } from './monte-carlo';

export interface Agreement {
  /** Do the ends of both intervals agree to the last of two digits of the standard uncertainty? */
  agree: boolean;
  /** How much further out the simulation's ends are, in the unit of the result; below 0: further in. */
  lowFurther: number;
  highFurther: number;
  /** Half a unit of the second digit of the standard uncertainty. */
  tolerance: number;
  /** False: too few trials to tell, since two standard errors of the simulation would turn the answer. */
  enoughTrials: boolean;
}

/** The budget's interval `value` ± U beside the simulation's. JCGM 101:2008, 7.9.2 and 8.1. */
export function budgetAgreement(
  value: number,
  budget: Budget,
  simulated: Extract<MonteCarlo, { kind: 'found' }>,
): Agreement {
  const tolerance = 0.5 * 10 ** (Math.floor(Math.log10(budget.standard)) - 1);
  const lowFurther = value - budget.expanded - simulated.low;
  const highFurther = simulated.high - (value + budget.expanded);
  return {
    agree: Math.abs(lowFurther) <= tolerance && Math.abs(highFurther) <= tolerance,
    lowFurther,
    highFurther,
    tolerance,
    enoughTrials: [lowFurther, highFurther].every((d) => Math.abs(Math.abs(d) - tolerance) > 2 * simulated.endError),
  };
}

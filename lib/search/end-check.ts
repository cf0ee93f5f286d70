import type { Pair } from './assumptions';
import { overshootBound } from './overshoot-range';
import type { Move } from './plan-move';
import type { PointEstimate } from './types';

/**
 * The end check of a result: landing safely at trip plus a guard the output stays on, at trip minus it goes off; at
 * release minus a guard it stays off, at release plus it comes on. A failure is one more outcome, and the search goes on.
 */
export interface EndCheck {
  /** What is left to show for each point. */
  remaining: Pair<'landing' | 'crossing' | 'nothing'>;
  failures: number;
  /** Set while a check move is under way: whether the output must flip, and whether the move completes its stage. */
  expected: { flip: boolean; completes: boolean } | null;
}

export const mostFailedChecks = 3;

export const freshCheck = (failures: number): EndCheck => ({
  remaining: { trip: 'landing', release: 'landing' },
  failures,
  expected: null,
});

export const guardVolts = (point: PointEstimate, noise: number) =>
  Math.max(5e-3, 4 * noise + 2 * point.standardUncertaintyVolts);

/** The next check move of the armed point, in fall coordinates; `mean` and `guard` are of that point. */
export function planCheck(
  check: EndCheck,
  armed: 'trip' | 'release',
  from: number,
  mean: number,
  guard: number,
): { move: Move; check: EndCheck } {
  const stage = check.remaining[armed];
  if (stage !== 'landing') {
    // A point already shown is only crossed again, to arm the other: the search had gone on in between.
    return {
      move: { to: mean - guard, dwell: 'settle' },
      check: { ...check, expected: { flip: true, completes: stage === 'crossing' } },
    };
  }
  const landing = mean + guard;
  const far = overshootBound * (from - landing) > guard / 4;
  return far
    ? {
        move: { to: (landing + overshootBound * from) / (1 + overshootBound), dwell: 'waypoint' },
        check: { ...check, expected: { flip: false, completes: false } },
      }
    : {
        move: { to: landing, dwell: 'settle' },
        check: { ...check, expected: { flip: false, completes: true } },
      };
}

/** The check after its move was seen. */
export function observeCheck(check: EndCheck, armed: 'trip' | 'release', flipped: boolean): EndCheck {
  if (!check.expected) return check;
  if (check.expected.flip !== flipped) return freshCheck(check.failures + 1);
  const remaining = check.expected.completes
    ? { ...check.remaining, [armed]: check.remaining[armed] === 'landing' ? 'crossing' : 'nothing' }
    : check.remaining;
  return { ...check, remaining, expected: null };
}

export const checkIsComplete = ({ remaining }: EndCheck) =>
  remaining.trip === 'nothing' && remaining.release === 'nothing';

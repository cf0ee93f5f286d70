import type { ShareInterval } from './interval';
import { wilson } from './wilson';

interface Count {
  successes: number;
  trials: number;
}

/**
 * Interval of the share of `a` less that of `b` (-1 to 1), from two independent samples. R. G. Newcombe, Statistics in
 * Medicine 17 (1998), method 10: the Wilson limits of both, squared and added.
 */
export function newcombeDifference(a: Count, b: Count, confidence = 0.95): ShareInterval & { difference: number } {
  const ofA = wilson(a.successes, a.trials, confidence);
  const ofB = wilson(b.successes, b.trials, confidence);
  const shareA = a.successes / a.trials;
  const shareB = b.successes / b.trials;
  return {
    difference: shareA - shareB,
    low: shareA - shareB - Math.hypot(shareA - ofA.low, ofB.high - shareB),
    high: shareA - shareB + Math.hypot(ofA.high - shareA, shareB - ofB.low),
  };
}

import type { SequenceFinding } from '../../sequence/finding';
import { guardBandOf } from '../../decision/judge-value';
import { combineContributions } from '../../uncertainty/combine';
import { longWaitMs, minutesText, supplyRules } from '../common-rules';
import { failing, setTo } from '../failing';
import { millisecondsText, millivoltsText, upTo } from '../number-words';
import type { RuleContext } from '../step-kind';
import { driftBudget } from './drift';
import type { SoakStep } from './schema';

/** One reading over a cycle of the mains, its relay and its exchange of messages. */
const readingMs = 60;
/** Below this a soak is no soak: drift does not show. */
const shortestMs = 1_000;

export function rules(step: SoakStep, context: RuleContext): SequenceFinding[] {
  const lastsMs = (step.readings - 1) * step.everyMs;
  const everyMs = upTo(shortestMs / (step.readings - 1), 0);
  return [
    ...supplyRules(step, 'atVolts', step.atVolts, context),
    ...failing(step.everyMs < readingMs, 'error', step, {
      problem: 'interval-too-short',
      field: 'everyMs',
      sentence: `${millisecondsText(step.everyMs)} is too short. A reading takes ${millisecondsText(readingMs)}.`,
      mend: setTo(step, 'everyMs', readingMs, millisecondsText(readingMs)),
    }),
    ...failing(step.everyMs >= readingMs && lastsMs < shortestMs, 'warning', step, {
      problem: 'soak-short',
      field: 'everyMs',
      sentence: `The soak lasts ${millisecondsText(lastsMs)}. Drift shows over ${millisecondsText(shortestMs)} and more.`,
      mend: setTo(step, 'everyMs', everyMs, millisecondsText(everyMs)),
    }),
    ...failing(lastsMs > longWaitMs, 'warning', step, {
      problem: 'soak-long',
      field: 'everyMs',
      sentence: `Every board soaks for ${minutesText(lastsMs)}.`,
    }),
    ...driftRules(step, context),
  ];
}

/** A drift limit has to leave something beside the guard; the meter's own share of U is what is known beforehand. */
function driftRules(step: SoakStep, { decisionRule, station }: RuleContext): SequenceFinding[] {
  const still = Array.from({ length: step.readings }, (_, n) => ({ atMs: n * step.everyMs, volts: 0 }));
  const { expanded } = combineContributions(driftBudget(still, station.meter));
  const hidden = guardBandOf(decisionRule, expanded) >= step.mostDriftVolts;
  const enough = upTo(4 * expanded, 4);
  return failing(step.mostDriftVolts <= expanded, hidden ? 'error' : 'warning', step, {
    problem: 'drift-finer-than-uncertainty',
    field: 'mostDriftVolts',
    sentence: `${millivoltsText(step.mostDriftVolts)} is too fine. A drift is known to ${millivoltsText(upTo(expanded, 4))}.`,
    mend: setTo(step, 'mostDriftVolts', enough, millivoltsText(enough)),
  });
}

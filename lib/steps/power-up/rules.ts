import type { SequenceFinding } from '../../sequence/finding';
import { overshootAtMost, settleRules } from '../common-rules';
import { failing, setTo } from '../failing';
import { tolerancesOf } from '../../contracts/board-type';
import { ampsText, downTo, upTo, voltsText } from '../number-words';
import type { RuleContext } from '../step-kind';
import type { PowerUpStep } from './schema';

/** A supply this near its current limit is taken to be limiting. */
const atLimitShare = 0.97;

export function rules(step: PowerUpStep, context: RuleContext): SequenceFinding[] {
  const { absoluteMaximumVolts } = context.boardType;
  return [
    ...failing(step.overvoltageVolts > absoluteMaximumVolts, 'error', step, {
      problem: 'overvoltage-above-maximum',
      field: 'overvoltageVolts',
      sentence: `Protection at ${voltsText(step.overvoltageVolts)} is too late. The board bears ${voltsText(absoluteMaximumVolts)} at most.`,
      mend: setTo(step, 'overvoltageVolts', absoluteMaximumVolts, voltsText(absoluteMaximumVolts)),
    }),
    ...workingVoltsRules(step, context),
    ...currentRules(step, context),
    ...settleRules(step, context),
  ];
}

/** High enough to release every board, low enough that the rise from zero overshoots neither maximum nor protection. */
function workingVoltsRules(step: PowerUpStep, { boardType, station }: RuleContext): SequenceFinding[] {
  const releaseMax = boardType.limits.releaseVolts.max;
  const overshoot = overshootAtMost(station);
  const ceiling = Math.min(step.overvoltageVolts, boardType.absoluteMaximumVolts);
  const most = downTo(ceiling / (1 + overshoot), 2);
  const enough = Math.min(most, upTo((releaseMax + most) / 2, 1));
  return [
    ...failing(step.volts <= releaseMax, 'error', step, {
      problem: 'working-volts-too-low',
      field: 'volts',
      sentence: `${voltsText(step.volts)} is too low. A board may release only at ${voltsText(releaseMax)}.`,
      mend: enough > releaseMax ? setTo(step, 'volts', enough, voltsText(enough)) : null,
    }),
    ...failing(step.volts > most, 'error', step, {
      problem: 'working-volts-too-high',
      field: 'volts',
      sentence: `${voltsText(step.volts)} is too high. The supply overshoots by up to ${(overshoot * 100).toFixed(1)} %, to ${voltsText(step.volts * (1 + overshoot))}; ${voltsText(ceiling)} is allowed.`,
      mend: most > releaseMax ? setTo(step, 'volts', most, voltsText(most)) : null,
    }),
  ];
}

function currentRules(step: PowerUpStep, { boardType }: RuleContext): SequenceFinding[] {
  const { design, limits } = boardType;
  const load = step.volts / (design.loadOhms * (1 - tolerancesOf(boardType).loadOhms));
  const needed = (load + limits.quiescentAmps.max) / atLimitShare;
  const enough = upTo(1.2 * needed, 2);
  return failing(step.currentLimitAmps <= needed, 'error', step, {
    problem: 'current-limit-too-low',
    field: 'currentLimitAmps',
    sentence: `${ampsText(step.currentLimitAmps)} is too low. A sound board may draw ${ampsText(upTo(needed, 3))} with its load on.`,
    mend: setTo(step, 'currentLimitAmps', enough, ampsText(enough)),
  });
}

import { pointsAt, wiperFor } from '../../trim/board-model';
import type { SequenceFinding } from '../../sequence/finding';
import { pointUncertainty } from '../common-rules';
import { failing, setTo } from '../failing';
import { downTo, millivoltsText, upTo, voltsText } from '../number-words';
import type { RuleContext } from '../step-kind';
import type { TrimStep } from './schema';
import { settableVolts } from './settable';

export function rules(step: TrimStep, context: RuleContext): SequenceFinding[] {
  const { design } = context.boardType;
  const wiper = wiperFor(design, step.targetVolts);
  if (!(wiper >= 0 && wiper <= 1)) return outsideTravel(step, context);
  return [...withinLimits(step, context), ...releaseAtTarget(step, wiper, context), ...fineEnough(step, context)];
}

function outsideTravel(step: TrimStep, { boardType }: RuleContext): SequenceFinding[] {
  const ends = [0.0001, 0.9999].map((wiper) => pointsAt(boardType.design, wiper).tripVolts).sort((a, b) => a - b);
  return failing(true, 'error', step, {
    problem: 'target-outside-travel',
    field: 'targetVolts',
    sentence: `The trimmer does not reach ${voltsText(step.targetVolts)}. Its travel is from ${voltsText(ends[0]!)} to ${voltsText(ends[1]!)}.`,
  });
}

/** Wherever in its tolerance the trim ends, the trip point passes: inside the limits less the guard. */
function withinLimits(step: TrimStep, context: RuleContext): SequenceFinding[] {
  const { targetVolts, toleranceVolts } = step;
  const { min, max } = context.boardType.limits.tripVolts;
  const { guard } = pointUncertainty(targetVolts, context);
  const [low, high] = [min + guard, max - guard];
  const drawnIn = guard > 0 ? `, less a guard of ${millivoltsText(upTo(guard, 4))}` : '';
  const limits = `The limits are ${voltsText(min)} to ${voltsText(max)}${drawnIn}.`;
  const most = downTo((high - low) / 2, 3);
  if (toleranceVolts > (high - low) / 2) {
    return failing(true, 'error', step, {
      problem: 'tolerance-wider-than-limits',
      field: 'toleranceVolts',
      sentence: `±${millivoltsText(toleranceVolts)} does not fit. ${limits}`,
      mend: most > 0 ? setTo(step, 'toleranceVolts', most, millivoltsText(most)) : null,
    });
  }
  const nearest = Math.min(high - toleranceVolts, Math.max(low + toleranceVolts, targetVolts));
  const inwards = nearest > targetVolts ? upTo(nearest, 3) : downTo(nearest, 3);
  return failing(targetVolts - toleranceVolts < low || targetVolts + toleranceVolts > high, 'error', step, {
    problem: 'target-outside-limits',
    field: 'targetVolts',
    sentence: `${voltsText(targetVolts)} ± ${millivoltsText(toleranceVolts)} reaches outside. ${limits}`,
    mend: inRange(inwards, low, high, toleranceVolts) ? setTo(step, 'targetVolts', inwards, voltsText(inwards)) : null,
  });
}

const inRange = (target: number, low: number, high: number, tolerance: number) =>
  target - tolerance >= low && target + tolerance <= high;

/** Both points move with the screw: where a nominal board trips at the target, it releases inside its limits too. */
function releaseAtTarget(step: TrimStep, wiper: number, { boardType }: RuleContext): SequenceFinding[] {
  const { releaseVolts } = pointsAt(boardType.design, wiper);
  const { min, max } = boardType.limits.releaseVolts;
  return failing(releaseVolts < min || releaseVolts > max, 'warning', step, {
    problem: 'release-outside-at-target',
    field: 'targetVolts',
    sentence: `A nominal board that trips at ${voltsText(step.targetVolts)} releases at ${voltsText(releaseVolts)}. Its limits are ${voltsText(min)} to ${voltsText(max)}.`,
  });
}

/** Not finer than the screw can be set, nor than the result is known. */
function fineEnough(step: TrimStep, context: RuleContext): SequenceFinding[] {
  const { targetVolts, toleranceVolts } = step;
  const { trimmer, limits } = context.boardType;
  const settable = upTo(settableVolts(context.boardType, targetVolts), 4);
  const { expanded, guard } = pointUncertainty(targetVolts, context);
  const enough = upTo(Math.max(settable, expanded), 3);
  const room = (limits.tripVolts.max - limits.tripVolts.min) / 2 - guard;
  const mend = enough <= room ? setTo(step, 'toleranceVolts', enough, millivoltsText(enough)) : null;
  const travel = trimmer.turns > 1 ? `${trimmer.turns} turns` : `${Math.round(trimmer.turns * 360)} degrees`;
  if (toleranceVolts < settable) {
    return failing(true, 'error', step, {
      problem: 'tolerance-finer-than-trimmer',
      field: 'toleranceVolts',
      sentence: `±${millivoltsText(toleranceVolts)} is too fine. A screw of ${travel} can be set to ${millivoltsText(settable)} here.`,
      mend,
    });
  }
  return failing(toleranceVolts < expanded, 'error', step, {
    problem: 'tolerance-finer-than-uncertainty',
    field: 'toleranceVolts',
    sentence: `±${millivoltsText(toleranceVolts)} is too fine. The trip point is known to ${millivoltsText(upTo(expanded, 4))}.`,
    mend,
  });
}

import type { SequenceFinding } from '../../sequence/finding';
import { failing, setTo } from '../failing';
import { downTo, millisecondsText, voltsText } from '../number-words';
import type { RuleContext } from '../step-kind';
import type { RideThroughStep } from './schema';
import { rideThroughVolts } from './ride-through-volts';

export function rules(step: RideThroughStep, context: RuleContext): SequenceFinding[] {
  const { tripVolts, releaseVolts, rideThroughSeconds } = context.boardType.limits;
  const { atVolts, milliseconds } = step;
  const between = atVolts > tripVolts.max && atVolts < releaseVolts.min;
  const good = rideThroughVolts(context.boardType.limits);
  const neededMs = rideThroughSeconds.min * 1000;
  return [
    ...failing(!between, 'error', step, {
      problem: 'ride-through-not-between-points',
      field: 'atVolts',
      sentence: `${voltsText(atVolts)} is not between the points. An output that drops stays off, and is seen, only from ${voltsText(tripVolts.max)} to ${voltsText(releaseVolts.min)}.`,
      mend: tripVolts.max < good && good < releaseVolts.min ? setTo(step, 'atVolts', good, voltsText(good)) : null,
    }),
    ...failing(milliseconds < neededMs - 1e-9, 'error', step, {
      problem: 'ride-through-too-short',
      field: 'milliseconds',
      sentence: `${millisecondsText(milliseconds)} is too short. The board has to outlast ${millisecondsText(neededMs)}.`,
      mend: setTo(step, 'milliseconds', neededMs, millisecondsText(neededMs)),
    }),
    ...(between ? reservoirRules(step, neededMs, context) : []),
  ];
}

/** The nominal reservoir feeds the load alone; a board that trips at the upper limit has to hold as well. */
function reservoirRules(step: RideThroughStep, neededMs: number, { boardType }: RuleContext): SequenceFinding[] {
  const { design, limits } = boardType;
  const holdsMs = 1000 * design.reservoirFarads * design.loadOhms * Math.log(step.atVolts / limits.tripVolts.max);
  const most = downTo(holdsMs, 1);
  return failing(step.milliseconds > holdsMs, 'warning', step, {
    problem: 'ride-through-beyond-reservoir',
    field: 'milliseconds',
    sentence: `${millisecondsText(step.milliseconds)} is long. The nominal reservoir holds ${millisecondsText(most)} from ${voltsText(step.atVolts)} down to ${voltsText(limits.tripVolts.max)}.`,
    mend: most >= neededMs ? setTo(step, 'milliseconds', most, millisecondsText(most)) : null,
  });
}

import type { SequenceFinding } from '../../sequence/finding';
import { failing, setTo } from '../failing';
import { downTo, voltsText } from '../number-words';
import type { RuleContext } from '../step-kind';
import type { SeatStep } from './schema';

/** A contact check has to leave the board asleep: at most this share of the lowest supply at which it is looked at. */
const asleepShare = 0.5;

export function rules(step: SeatStep, { boardType }: RuleContext): SequenceFinding[] {
  const most = downTo(boardType.search.supplyMinVolts * asleepShare, 1);
  return failing(step.contactCheck.volts > most, 'warning', step, {
    problem: 'contact-check-wakes-board',
    field: 'contactCheck.volts',
    sentence: `${voltsText(step.contactCheck.volts)} may wake the board. Contacts are checked below ${voltsText(most)}.`,
    mend: setTo(step, 'contactCheck.volts', Math.min(1.8, most), voltsText(Math.min(1.8, most))),
  });
}

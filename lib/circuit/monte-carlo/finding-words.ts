import type { PointPart } from '../sensitivities';
import type { LimitFinding, LimitFix, PartChange } from './types';

const partNames: Record<PointPart, string> = {
  referenceVolts: 'zener',
  referenceKnee: 'zener’s knee',
  feedOhms: 'bias resistor',
  trimmerOhms: 'trimmer',
  supplyEndOhms: 'upper end resistor',
  groundEndOhms: 'lower end resistor',
  feedbackOhms: 'feedback resistor',
  outputDropVolts: 'output drop',
  outputLowVolts: 'low output',
  comparatorOffsetVolts: 'comparator offset',
};

/** Verb for one board and for several, and what follows the limit. */
const ends = {
  release: [['releases', 'release'], 'V after trimming'],
  hysteresis: [['shows a hysteresis', 'show a hysteresis'], 'V after trimming'],
  reference: [['has a reference', 'have a reference'], 'V'],
} as const;

const volts = (value: number) => value.toFixed(2);

/** "4 boards in 100 cannot reach 10.00 V with this trimmer." */
export function missSentence({ quantity, misses, limits }: LimitFinding, targetVolts: number): string {
  const { count, boards } = boardsOf(misses.below + misses.above);
  if (quantity === 'target') return `${boards} cannot reach ${volts(targetVolts)} V with this trimmer.`;
  const [verbs, unit] = ends[quantity];
  const verb = verbs[count === 1 ? 0 : 1];
  if (misses.below > 0 && misses.above > 0) {
    return `${boards} ${verb} outside ${volts(limits!.min)} to ${volts(limits!.max)} ${unit}.`;
  }
  const [word, limit] = misses.below > 0 ? ['below', limits!.min] : ['above', limits!.max];
  return `${boards} ${verb} ${word} ${volts(limit)} ${unit}.`;
}

/** "The feedback resistor brings 84 % of the spread." */
export function driverSentence({ driver }: LimitFinding): string {
  return `The ${partNames[driver.part]} brings ${Math.round(driver.share * 100)} % of the spread.`;
}

/** What would hold: "With the feedback resistor at 102 kΩ, none would." */
export function fixSentence(fix: LimitFix): string {
  switch (fix.kind) {
    case 'parts':
      return `With ${fix.changes.map((change) => `the ${partNames[change.part]} at ${wordsOf(change)}`).join(' and ')}, none would.`;
    case 'limits':
      return `Limits of ${volts(fix.minVolts)} to ${volts(fix.maxVolts)} V would hold.`;
    case 'target':
      return `Every board reaches ${volts(fix.minVolts)} to ${volts(fix.maxVolts)} V.`;
  }
}

/** The button: "Use 102 kΩ". */
export function fixLabel(fix: LimitFix): string {
  switch (fix.kind) {
    case 'parts':
      return `Use ${fix.changes.map(wordsOf).join(', ')}`;
    case 'limits':
      return `Use ${volts(fix.minVolts)} to ${volts(fix.maxVolts)} V`;
    case 'target':
      return 'Choose another target';
  }
}

/** Counts of 100, or of 1,000 below one in 100. */
function boardsOf(share: number): { count: number; boards: string } {
  const inHundred = share >= 0.0095;
  const count = Math.max(1, Math.round(share * (inHundred ? 100 : 1000)));
  return { count, boards: `${count} ${count === 1 ? 'board' : 'boards'} in ${inHundred ? '100' : '1,000'}` };
}

function wordsOf({ part, value, tolerance }: PartChange): string {
  const words: string[] = [];
  if (value !== undefined) words.push(ohms(value));
  if (tolerance !== undefined) {
    words.push(
      part === 'comparatorOffsetVolts' ? `${tolerance * 1000} mV` : `± ${Number((tolerance * 100).toFixed(3))} %`,
    );
  }
  return words.join(' ');
}

function ohms(value: number): string {
  const [scale, unit] = value >= 1e6 ? [1e6, 'MΩ'] : value >= 1000 ? [1000, 'kΩ'] : [1, 'Ω'];
  return `${Number((value / scale).toPrecision(3))} ${unit}`;
}

import type { trimTypes } from './population';

export interface TrimRow {
  type: keyof typeof trimTypes;
  procedure: 'two beeps' | 'prompted' | 'prompted, 103 read' | 'wiper probe' | 'fixed V/turn' | 'secant';
  toleranceMillivolts: number;
  link: '115200' | '9600';
  boards: number;
  /** Share of first prompts turned the wrong way. */
  wrongWayShare: number;
}

const boards = 2000;

const procedures = ['two beeps', 'prompted', 'prompted, 103 read', 'wiper probe', 'fixed V/turn', 'secant'] as const;
const links = ['115200', '9600'] as const;

const row = (
  type: TrimRow['type'],
  procedure: TrimRow['procedure'],
  toleranceMillivolts: number,
  link: TrimRow['link'],
  wrongWayShare = 0,
): TrimRow => ({ type, procedure, toleranceMillivolts, link, boards, wrongWayShare });

/**
 * A dial that follows corrects itself, so channel 103 is shown where the turn is made as told, and in the target's row. On
 * the full span a dial that follows is chased without end.
 */
function isWorthShowing({ type, procedure, toleranceMillivolts, link }: TrimRow): boolean {
  const follows = procedure === 'wiper probe' || (procedure.startsWith('prompted') && link === '115200');
  if (type === 'full') return !follows;
  return procedure !== 'prompted, 103 read' || !follows || (type === 'multi' && toleranceMillivolts === 20);
}

const grid = (type: TrimRow['type'], tolerances: readonly number[]): TrimRow[] =>
  tolerances
    .flatMap((tolerance) =>
      links.flatMap((link) => procedures.map((procedure) => row(type, procedure, tolerance, link))),
    )
    .filter(isWorthShowing);

export const rows: readonly TrimRow[] = [
  ...grid('multi', [20, 10, 5]),
  ...grid('padded', [20, 10, 5]),
  // No hand sets a full-span single-turn trimmer to 20 mV: shown, without a target.
  ...grid('full', [20]),
  // The reference of a real board sags with the supply; and one in twenty turns the wrong way first.
  ...(['two beeps', 'prompted', 'prompted, 103 read', 'wiper probe'] as const).map((procedure) =>
    row('soft', procedure, 20, '9600'),
  ),
  ...(['two beeps', 'prompted', 'wiper probe'] as const).map((procedure) =>
    row('multi', procedure, 20, '115200', 0.05),
  ),
];

export const rowOf = (
  type: TrimRow['type'],
  procedure: TrimRow['procedure'],
  toleranceMillivolts: number,
  link: TrimRow['link'],
): TrimRow =>
  rows.find(
    (each) =>
      each.type === type &&
      each.procedure === procedure &&
      each.toleranceMillivolts === toleranceMillivolts &&
      each.link === link,
  )!;

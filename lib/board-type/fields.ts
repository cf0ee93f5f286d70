import {
  degreesStyle,
  microfaradsStyle,
  milliampsStyle,
  millisecondsStyle,
  millivoltsStyle,
  offsetStyle,
  ohmsStyle,
  toleranceStyle,
  turnsStyle,
  voltsStyle,
} from './quantity-styles';
import type { QuantityStyle } from './quantity-text';

/** One number of a board type. `path` leads to it in `BoardType`; `label` is how a form, a message and a comparison name it. */
export interface NumberField {
  path: string;
  label: string;
  style: QuantityStyle;
}

const volts = (path: string, label: string): NumberField => ({ path, label, style: voltsStyle });
const ohms = (path: string, label: string): NumberField => ({ path, label, style: ohmsStyle });
const tolerance = (name: string, label: string): NumberField => ({
  path: `tolerances.${name}`,
  label: `${label}, tolerance`,
  style: toleranceStyle,
});
const amps = (path: string, label: string): NumberField => ({ path, label, style: milliampsStyle });

/** A part of the circuit with its value and tolerance, from left to right as drawn. */
export interface CircuitPart {
  id: string;
  name: string;
  fields: readonly NumberField[];
}

const part = (id: string, name: string, ...fields: NumberField[]): CircuitPart => ({ id, name, fields });

/** Drawn in the schematic, in its order from left to right. */
export const drawnParts: readonly CircuitPart[] = [
  part(
    'reservoir',
    'C1 reservoir',
    { path: 'design.reservoirFarads', label: 'C1 reservoir', style: microfaradsStyle },
    tolerance('reservoirFarads', 'C1 reservoir'),
  ),
  part(
    'upper-end',
    'R1 upper end',
    ohms('design.supplyEndOhms', 'R1 upper end'),
    tolerance('supplyEndOhms', 'R1 upper end'),
  ),
  part('trimmer', 'RV1 trimmer', ohms('design.trimmerOhms', 'RV1 trimmer'), tolerance('trimmerOhms', 'RV1 trimmer')),
  part(
    'lower-end',
    'R2 lower end',
    ohms('design.groundEndOhms', 'R2 lower end'),
    tolerance('groundEndOhms', 'R2 lower end'),
  ),
  part('bias', 'R3 bias', ohms('design.reference.feedOhms', 'R3 bias'), tolerance('feedOhms', 'R3 bias')),
  part(
    'zener',
    'D1 zener',
    volts('design.reference.nominalVolts', 'D1 zener'),
    tolerance('referenceVolts', 'D1 zener'),
  ),
  part('feedback', 'R5 feedback', ohms('design.feedbackOhms', 'R5 feedback'), tolerance('feedbackOhms', 'R5 feedback')),
  part('comparator', 'U1 offset', {
    path: 'tolerances.comparatorOffsetVolts',
    label: 'U1 offset',
    style: offsetStyle,
  }),
  part('load', 'load', ohms('design.loadOhms', 'Load'), tolerance('loadOhms', 'Load')),
];

/** What a drawing does not show. */
export const undrawnParts: readonly CircuitPart[] = [
  part('rated', 'Zener’s rated current', amps('design.reference.ratedAmps', 'Zener’s rated current')),
  part(
    'knee',
    'Zener’s knee',
    { path: 'design.reference.kneeVolts', label: 'Zener’s knee', style: millivoltsStyle },
    tolerance('referenceKnee', 'Zener’s knee'),
  ),
  part(
    'drop',
    'Output high, below the supply',
    volts('design.outputDropVolts', 'Output drop'),
    tolerance('outputDropVolts', 'Output drop'),
  ),
  part('low', 'Output low', volts('design.outputLowVolts', 'Output low'), tolerance('outputLowVolts', 'Output low')),
  part(
    'quiescent',
    'Own current, without load',
    amps('design.quiescentAmps', 'Own current'),
    tolerance('quiescentAmps', 'Own current'),
  ),
];

/** Minimum and maximum, or one of them. */
export interface LimitRow {
  name: string;
  point?: 'trip' | 'release';
  min?: NumberField;
  max?: NumberField;
}

const band = (path: string, name: string, point?: LimitRow['point']): LimitRow => ({
  name,
  point,
  min: volts(`${path}.min`, `${name}, at least`),
  max: volts(`${path}.max`, `${name}, at most`),
});

export const limitRows: readonly LimitRow[] = [
  band('limits.tripVolts', 'Trip point', 'trip'),
  band('limits.releaseVolts', 'Release point', 'release'),
  band('limits.hysteresisVolts', 'Hysteresis'),
  band('limits.referenceVolts', 'Reference'),
  {
    name: 'Output high, below the supply',
    max: volts('limits.outputHighDropVolts.max', 'Output high, below the supply, at most'),
  },
  { name: 'Output low', max: volts('limits.outputLowVolts.max', 'Output low, at most') },
  { name: 'Quiescent current', max: amps('limits.quiescentAmps.max', 'Quiescent current, at most') },
  {
    name: 'Ride-through',
    min: { path: 'limits.rideThroughSeconds.min', label: 'Ride-through, at least', style: millisecondsStyle },
  },
];

export const searchRows: readonly LimitRow[] = [
  { name: 'Lowest supply', min: volts('search.supplyMinVolts', 'Lowest supply') },
  band('search.tripVolts', 'Trip point is looked for'),
  band('search.hysteresisVolts', 'Hysteresis is looked for'),
  {
    name: 'Noise of the comparator',
    max: { path: 'search.noiseVolts', label: 'Noise of the comparator', style: millivoltsStyle },
  },
];

export const absoluteMaximumField = volts('absoluteMaximumVolts', 'Absolute maximum supply');
export const thresholdVoltsField = volts('sensing.thresholdVolts', 'On above');
export const thresholdAmpsField = amps('sensing.thresholdAmps', 'On above');

/** Turns where `unit` is turns; degrees are kept as turns too. */
export const travelFields = (unit: 'turns' | 'degrees') => ({
  travel: { path: 'trimmer.turns', label: 'Travel', style: unit === 'turns' ? turnsStyle : degreesStyle },
  backlash: { path: 'trimmer.backlashTurns', label: 'Backlash', style: degreesStyle },
});
/** Paths that are kept in turns and may be shown in degrees. */
export const degreesATurn = 360;

export const mostAttemptsField: NumberField = {
  path: 'mostAttempts',
  label: 'Most attempts',
  style: { unit: 'times', bareExponent: 0, shownExponents: [0] },
};

import type { Step, StepKind } from '../../sequence/step';
import type { StepMachine } from '../machine';
import { findPoints } from './find-points';
import { operatorCheck } from './operator-check';
import { outputLevels } from './output-levels';
import { powerUp } from './power-up';
import { quiescentCurrent } from './quiescent-current';
import { record } from './record';
import { reference } from './reference';
import { rideThrough } from './ride-through';
import { seal } from './seal';
import { seat } from './seat';
import { trim } from './trim';
import { verify } from './verify';

const machines = {
  seat,
  'power-up': powerUp,
  reference,
  'find-points': findPoints,
  trim,
  seal,
  verify,
  'output-levels': outputLevels,
  'quiescent-current': quiescentCurrent,
  'ride-through': rideThrough,
  'operator-check': operatorCheck,
  record,
} satisfies { [K in StepKind]: StepMachine<Extract<Step, { kind: K }>, unknown> };

/** The machine of a step. The run hands each one its own step and its own state back, and nothing else. */
export function machineOf(step: Step): StepMachine<Step, unknown> {
  return machines[step.kind] as unknown as StepMachine<Step, unknown>;
}

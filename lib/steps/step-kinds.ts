import type { Step } from '../sequence/step';
import type { StepKindDefinition } from './step-kind';
import { applyVoltage } from './apply-voltage/kind';
import { branch } from './branch/kind';
import { findPoints } from './find-points/kind';
import { instruction } from './instruction/kind';
import { measureChannel } from './measure-channel/kind';
import { operatorCheck } from './operator-check/kind';
import { outputLevels } from './output-levels/kind';
import { powerUp } from './power-up/kind';
import { quiescentCurrent } from './quiescent-current/kind';
import { record } from './record/kind';
import { reference } from './reference/kind';
import { rideThrough } from './ride-through/kind';
import { seal } from './seal/kind';
import { seat } from './seat/kind';
import { soak } from './soak/kind';
import { trim } from './trim/kind';
import { verify } from './verify/kind';

/** Every kind of step, in the order in which a list of them is shown. */
export const stepKinds = [
  seat,
  powerUp,
  reference,
  findPoints,
  trim,
  seal,
  verify,
  outputLevels,
  quiescentCurrent,
  rideThrough,
  operatorCheck,
  measureChannel,
  applyVoltage,
  soak,
  branch,
  instruction,
  record,
] as const;

const byKind = new Map<string, unknown>(stepKinds.map((each) => [each.kind, each]));

/** The kind of a step. Each of its parts is handed that step and its own machine back, and nothing else. */
export function kindOf(step: Pick<Step, 'kind'>): StepKindDefinition {
  return byKind.get(step.kind) as StepKindDefinition;
}

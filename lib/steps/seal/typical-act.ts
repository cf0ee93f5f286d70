import type { StepContext } from '../../run/machine';
import type { TypicalAct } from '../step-kind';
import type { SealMachine } from './machine';
import type { SealStep } from './schema';

/** Common practice, no source. */
const lidMs = 1_200;
const sealMs = 6_000;

export function typicalAct(machine: SealMachine, _step: SealStep, { plan }: StepContext): TypicalAct | null {
  const lid = (closed: boolean): TypicalAct['act'] =>
    plan.hasController ? { kind: 'lid', closed } : { kind: 'confirm', what: closed ? 'lid-closed' : 'lid-open' };
  switch (machine.stage) {
    case 'open-lid':
      return { act: lid(false), afterMs: lidMs };
    case 'seal-screw':
      return { act: { kind: 'confirm', what: 'sealed' }, afterMs: sealMs };
    case 'close-lid':
      return { act: lid(true), afterMs: lidMs };
    default:
      return null;
  }
}

import type { TypicalAct } from '../step-kind';
import type { OperatorCheckMachine } from './machine';

/** Common practice, no source. */
const answerMs = 2_000;

export function typicalAct(machine: OperatorCheckMachine): TypicalAct | null {
  return machine.stage === 'asking' ? { act: { kind: 'answer', ok: true }, afterMs: answerMs } : null;
}

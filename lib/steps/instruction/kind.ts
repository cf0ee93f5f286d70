import type { StepKindDefinition } from '../step-kind';
import { machine, type InstructionMachine } from './machine';
import { rules } from './rules';
import { schema, type InstructionStep } from './schema';
import { sentence } from './sentence';
import { typicalAct } from './typical-act';

export const instruction: StepKindDefinition<InstructionStep, InstructionMachine> = {
  kind: 'instruction',
  word: 'Instruction',
  purpose: 'Something only a person can do, in your words.',
  group: 'check',
  schema,
  fresh: () => ({ kind: 'instruction', text: 'Check the board.', pictureId: null, supplyOff: true }),
  rules,
  needs: () => [],
  required: () => [],
  machine,
  typicalAct,
  sentence,
};

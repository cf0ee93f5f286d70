import { checks } from '../required';
import type { StepKindDefinition } from '../step-kind';
import { machine, type SeatMachine } from './machine';
import { rules } from './rules';
import { schema, type SeatStep } from './schema';
import { sentence } from './sentence';
import { typicalAct } from './typical-act';

export const seat: StepKindDefinition<SeatStep, SeatMachine> = {
  kind: 'seat',
  word: 'Seat the board',
  purpose: 'Lid closed over a board, then a contact check.',
  group: 'seat',
  schema,
  fresh: () => ({ kind: 'seat', contactCheck: { volts: 1.8, currentLimitAmps: 0.02, mostMilliohms: 5_000 } }),
  rules,
  needs: () => [],
  required: () => checks('contact-milliohms'),
  machine,
  typicalAct,
  sentence,
};

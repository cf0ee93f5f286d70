import { kindOf } from '../steps/step-kinds';
import { kindWords } from '../steps/kind-words';
import type { SequenceFinding } from './finding';
import type { Step, StepKind } from './step';

/** What may stand between the board on the fixture and the power-up. */
const beforePower: readonly StepKind[] = ['instruction'];
/** Once in a sequence. */
const once: readonly StepKind[] = ['seat', 'power-up', 'record'];

interface Order {
  /** Those that are run. */
  steps: readonly Step[];
  allSteps: readonly Step[];
}

/** What the order of the steps that are run gets wrong; `allSteps` has those that rest too. */
export function checkOrder(order: Order): SequenceFinding[] {
  return [...checkStart(order), ...checkEnd(order), ...checkPoints(order), ...checkRepeats(order)];
}

const first = ({ steps }: Order, kind: StepKind) => steps.findIndex((step) => step.kind === kind);

function told(problem: string, step: Step | null, sentence: string): SequenceFinding {
  return { problem, severity: 'error', stepId: step?.id ?? null, field: null, sentence, mend: null };
}

/** A step that is missing because it rests is one tap away. */
function missing({ allSteps }: Order, kind: StepKind, problem: string, sentence: string): SequenceFinding {
  const resting = allSteps.find((step) => step.kind === kind && !step.enabled);
  const mend = resting && {
    label: `Run ${kindWords(resting)}`,
    changes: [{ stepId: resting.id, field: 'enabled', value: true }],
  };
  return { ...told(problem, null, sentence), mend: mend ?? null };
}

function checkStart(order: Order): SequenceFinding[] {
  const { steps } = order;
  const found: SequenceFinding[] = [];
  const seat = first(order, 'seat');
  if (seat < 0)
    found.push(missing(order, 'seat', 'seat-not-first', 'Nothing seats the board and checks its contacts.'));
  if (seat > 0) found.push(told('seat-not-first', steps[seat]!, 'The board is seated first.'));
  const power = first(order, 'power-up');
  if (power < 0) found.push(missing(order, 'power-up', 'power-up-missing', 'Nothing powers the board up.'));
  else if (steps.slice(seat + 1, power).some(({ kind }) => !beforePower.includes(kind))) {
    found.push(told('power-up-missing', steps[power]!, 'The board is powered up before anything is measured.'));
  }
  return found;
}

function checkEnd(order: Order): SequenceFinding[] {
  const record = first(order, 'record');
  if (record < 0) return [missing(order, 'record', 'record-not-last', 'Nothing switches the supply off at the end.')];
  const sentence = 'Steps follow the record. It switches the supply off and comes last.';
  return record < order.steps.length - 1 ? [told('record-not-last', order.steps[record]!, sentence)] : [];
}

/** Found before they are trimmed, verified after the screw was touched, and the screw sealed. */
function checkPoints(order: Order): SequenceFinding[] {
  const { steps } = order;
  const found: SequenceFinding[] = [];
  const verify = steps.findLastIndex(({ kind }) => kind === 'verify');
  const moved = steps.findLastIndex((step) => kindOf(step).movesPoints === true);
  if (verify < 0) {
    found.push(missing(order, 'verify', 'verify-missing', 'Nothing is verified, so no board can pass.'));
  } else if (verify < moved) {
    const sentence = 'The screw is touched after the last verification. Verify again afterwards.';
    found.push(told('trim-not-verified', steps[moved]!, sentence));
  }
  const trim = first(order, 'trim');
  if (trim < 0) return found;
  const find = first(order, 'find-points');
  if (find < 0 || find > trim) {
    const sentence = 'The trim starts from points that nothing has found yet.';
    const { mend } = missing(order, 'find-points', 'find-missing', sentence);
    found.push({ ...told('find-missing', steps[trim]!, sentence), mend: find < 0 ? mend : null });
  }
  const lastTrim = steps.findLastIndex(({ kind }) => kind === 'trim');
  if (!steps.slice(lastTrim).some(({ kind }) => kind === 'seal')) {
    const sentence = 'The screw is not sealed after the trim, so it may move later.';
    found.push({ ...told('trim-not-sealed', steps[lastTrim]!, sentence), severity: 'warning' });
  }
  return found;
}

function checkRepeats(order: Order): SequenceFinding[] {
  return order.steps.flatMap((step, index) =>
    once.includes(step.kind) && first(order, step.kind) < index
      ? [told('step-repeated', step, `A sequence has one ${kindWords({ ...step, name: '' })}.`)]
      : [],
  );
}

import type { SequenceFinding } from '../../sequence/finding';
import type { Step } from '../../sequence/step';
import { failing, setTo } from '../failing';
import { kindWords } from '../kind-words';
import type { RuleContext } from '../step-kind';
import type { BranchStep } from './schema';

/** What every board goes through, whichever way it takes. */
const neverLeftOut: readonly Step['kind'][] = ['seat', 'power-up', 'verify', 'record'];
/** Nothing is lost without them. */
const nothingLost: readonly Step['kind'][] = ['branch', 'apply-voltage', 'trim', 'seal', 'find-points'];

/** What the way ahead leaves out. */
export function forwardRules(step: BranchStep, to: number, { steps, index }: RuleContext): SequenceFinding[] {
  const leftOut = steps.slice(index + 1, to);
  const trimmed = steps.slice(0, index).some(({ kind }) => kind === 'trim');
  const forbidden = leftOut.filter(({ kind }) => neverLeftOut.includes(kind) || (kind === 'seal' && trimmed));
  const lost = leftOut.filter((each) => !forbidden.includes(each) && !nothingLost.includes(each.kind));
  return [
    ...failing(forbidden.length > 0, 'error', step, {
      problem: 'branch-leaves-out',
      field: 'goTo',
      sentence: `The branch leaves out ${words(forbidden)}. No board goes without.`,
      mend: forbidden[0] ? setTo(step, 'goTo', forbidden[0].id, kindWords(forbidden[0])) : null,
    }),
    ...failing(forbidden.length === 0 && lost.length > 0, 'warning', step, {
      problem: 'branch-leaves-out-checks',
      field: 'goTo',
      sentence: `Boards that take this branch go without ${words(lost)}.`,
    }),
  ];
}

/** Rounds through nested branches that a run may make at most. */
const mostRounds = 36;

/** Back to a step after the power-up, and not for ever. */
export function backwardRules(step: BranchStep, to: number, context: RuleContext): SequenceFinding[] {
  const { steps } = context;
  const poweredAt = steps.findIndex(({ kind }) => kind === 'power-up');
  if (to <= poweredAt) {
    const next = steps[poweredAt + 1];
    return failing(true, 'error', step, {
      problem: 'branch-restarts',
      field: 'goTo',
      sentence: 'The branch leads back to where the board is not powered up. Choose a step after the power-up.',
      mend: next && next.id !== step.id ? setTo(step, 'goTo', next.id, kindWords(next)) : null,
    });
  }
  const places = new Map(steps.map(({ id }, place) => [id, place]));
  const rounds = steps.reduce((product, each, place) => {
    const back = each.kind === 'branch' && (places.get(each.goTo) ?? Infinity) < place;
    return back ? product * (each.mostTimes + 1) : product;
  }, 1);
  return failing(rounds > mostRounds, 'error', step, {
    problem: 'branch-goes-round',
    field: 'mostTimes',
    sentence: `The branches that lead back may take a board round ${rounds} times. ${mostRounds} is the most.`,
    mend: step.mostTimes > 1 ? setTo(step, 'mostTimes', 1, '1') : null,
  });
}

const words = (steps: readonly Step[]) => {
  const names = steps.map(kindWords);
  const last = names.at(-1)!;
  return names.length > 1 ? `${names.slice(0, -1).join(', ')} and ${last}` : last;
};

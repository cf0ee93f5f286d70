import { describe, expect, it } from 'vitest';
import { advanceRun, beginRun, resultOf } from '@/lib/run/run';
import type { RunEvent } from '@/lib/run/types';
import { viewRun } from '@/lib/run/view';
import { planFor } from './play-board';
import { Plant } from './plant';

/** A board that is not steady, whose contacts read as `contact` says once the engine looks closer. */
function unsteady(contact: 'holds' | 'lost') {
  const plan = planFor('CB1210');
  const plant = new Plant({ boardType: plan.boardType, seed: 1, defect: 'noisy-wiper' });
  plant.lidClosed = plant.boardPresent = true;
  const seen: string[] = [];
  let now = beginRun(plan, plant.nowMs);
  while (!resultOf(now.state)) {
    const [effect] = now.effects;
    if (!effect || effect.kind === 'record-run') throw new Error('Waits for nobody.');
    const { screen } = viewRun(now.state);
    const what = screen.kind === 'measuring' ? screen.what.code : screen.kind;
    if (seen.at(-1) !== what) seen.push(what);
    let answer: RunEvent = plant.perform(effect);
    if (contact === 'lost' && what === 'run.looking-closer') {
      if (answer.kind === 'measured') answer = { ...answer, volts: 0.01 };
      if (answer.kind === 'supply-measured') answer = { ...answer, amps: 1e-6 };
    }
    now = advanceRun(now.state, answer);
  }
  return { result: resultOf(now.state)!, seen };
}

describe('a search that does not resolve', () => {
  it('is repeated once, then the contacts are checked', () => {
    const { seen } = unsteady('holds');
    const order = ['run.find-points', 'run.find-again', 'run.looking-closer'];
    expect(seen.filter((what) => order.includes(what))).toEqual(order);
  });
  it('rejects the board as not steady when the contacts hold', () => {
    expect(unsteady('holds').result).toMatchObject({
      verdict: 'reject',
      rejectReason: 'point-not-steady',
      likelyCause: 'noisy-wiper-or-contact',
    });
  });
  it('has no verdict when a contact is lost: that is the fixture’s', () => {
    expect(unsteady('lost').result).toMatchObject({
      verdict: 'no-verdict',
      noVerdictReason: 'contact-lost',
      rejectReason: null,
      failingWhenStopped: false,
    });
  });
});

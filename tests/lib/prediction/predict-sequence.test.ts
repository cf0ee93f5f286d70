import { describe, expect, it } from 'vitest';
import { boardTypes, cb1210, cb2420 } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import { predictSequence } from '@/lib/prediction/predict-sequence';
import { StepMemo } from '@/lib/prediction/step-memo';
import { usualStation } from '@/lib/prediction/types';
import type { Sequence, Step } from '@/lib/sequence/step';

const cutoff = sequences[0]!.sequence;
const changed = (sequence: Sequence, id: string, change: object): Sequence => ({
  ...sequence,
  steps: sequence.steps.map((step) => (step.id === id ? ({ ...step, ...change } as Step) : step)),
});
const inserted = (sequence: Sequence, before: string, ...steps: object[]): Sequence => {
  const at = sequence.steps.findIndex(({ id }) => id === before);
  const added = steps.map((step, i) => ({ id: `new-${i}`, name: '', enabled: true, ...step }) as Step);
  return { ...sequence, steps: sequence.steps.toSpliced(at, 0, ...added) };
};
const idOf = (kind: Step['kind']) => cutoff.steps.find((step) => step.kind === kind)!.id;

/** Counts the steps that are played and not remembered. */
class CountingMemo extends StepMemo {
  playedAgain: string[] = [];
  override play(...[step, entry, play]: Parameters<StepMemo['play']>) {
    return super.play(step, entry, (watched) => {
      this.playedAgain.push(step.id);
      return play(watched);
    });
  }
}

describe('prediction of a sequence', () => {
  it.each(sequences)(
    '$name passes on a typical board, its times in order and adding up',
    ({ boardTypeCode, sequence }) => {
      const boardType = boardTypes.find(({ code }) => code === boardTypeCode)!;
      const { steps, supply, loadOn, flips, totalMs, personMs, ending } = predictSequence(
        sequence,
        boardType,
        usualStation,
      );
      expect(ending).toEqual({ verdict: 'pass', reason: null, stepId: null });
      expect(steps.map(({ stepId }) => stepId)).toEqual(sequence.steps.map(({ id }) => id));
      steps.forEach((step, i) => {
        expect(step.fromMs).toBe(steps[i - 1]?.toMs ?? 0);
        expect(step.stationMs + step.personMs).toBeCloseTo(step.toMs - step.fromMs, 6);
      });
      expect(steps.at(-1)!.toMs).toBeCloseTo(totalMs, 6);
      expect(steps.reduce((sum, step) => sum + step.personMs, 0)).toBeCloseTo(personMs, 6);
      for (const list of [supply, flips]) {
        list.forEach(({ atMs }, i) => expect(atMs).toBeGreaterThanOrEqual(list[i - 1]?.atMs ?? 0));
      }
      expect(Math.max(...supply.map(({ volts }) => volts))).toBeLessThan(boardType.absoluteMaximumVolts);
      expect(supply.at(-1)!.volts).toBe(0);
      for (const { fromMs, toMs } of loadOn) expect(toMs).toBeGreaterThanOrEqual(fromMs);
    },
  );

  it('is the same with a memo and without', () => {
    const memo = new StepMemo();
    const first = predictSequence(cutoff, cb1210, usualStation, memo);
    expect(predictSequence(cutoff, cb1210, usualStation, memo)).toEqual(first);
    expect(predictSequence(cutoff, cb1210, usualStation)).toEqual(first);
    const slower = changed(cutoff, idOf('verify'), { settleMs: 90 });
    expect(predictSequence(slower, cb1210, usualStation, memo)).toEqual(predictSequence(slower, cb1210, usualStation));
    expect(predictSequence(cutoff, cb2420, usualStation, memo)).toEqual(predictSequence(cutoff, cb2420, usualStation));
  });

  it.each([
    ['reference', { settleMs: 500 }, ['reference']],
    ['verify', { mostSpreadVolts: 0.02 }, ['verify']],
    ['output-levels', { settleMs: 90 }, ['output-levels']],
    ['power-up', { settleMs: 400 }, ['power-up', 'seal']],
    ['find-points', { wantedUncertaintyVolts: 0.002 }, ['find-points', 'trim', 'seal']],
    ['operator-check', { question: 'Is the red lamp dark?' }, ['operator-check']],
  ] as const)('a change in %s plays only what depends on it again', (kind, change, kinds) => {
    const memo = new CountingMemo();
    predictSequence(cutoff, cb1210, usualStation, memo);
    memo.playedAgain = [];
    predictSequence(changed(cutoff, idOf(kind), change), cb1210, usualStation, memo);
    expect(memo.playedAgain).toEqual(kinds.map(idOf));
  });

  it.each([
    ['seat', { contactCheck: { volts: 1.5, currentLimitAmps: 0.02, mostMilliohms: 5_000 } }],
    ['power-up', { volts: 13.8 }],
    ['find-points', { windowMinVolts: 8, mostSettles: 140 }],
    ['trim', { targetVolts: 10.82 }],
  ] as const)('what other steps read of %s plays them again', (kind, change) => {
    const memo = new StepMemo();
    predictSequence(cutoff, cb1210, usualStation, memo);
    const edited = changed(cutoff, idOf(kind), change);
    expect(predictSequence(edited, cb1210, usualStation, memo)).toEqual(predictSequence(edited, cb1210, usualStation));
  });

  it('another name plays nothing again', () => {
    const memo = new CountingMemo();
    predictSequence(cutoff, cb1210, usualStation, memo);
    memo.playedAgain = [];
    predictSequence(changed(cutoff, idOf('verify'), { name: 'Check again' }), cb1210, usualStation, memo);
    expect(memo.playedAgain).toEqual([]);
  });

  it('leaves out a step that is not enabled', () => {
    const without = changed(cutoff, idOf('operator-check'), { enabled: false });
    const { steps, ending } = predictSequence(without, cb1210, usualStation);
    expect(steps.map(({ stepId }) => stepId)).not.toContain(idOf('operator-check'));
    expect(ending.verdict).toBe('pass');
  });

  it('names the step that would reject a typical board', () => {
    const limits = { ...cb1210.limits, outputHighDropVolts: { max: 1 } };
    const { ending, steps } = predictSequence(cutoff, { ...cb1210, limits }, usualStation);
    expect(ending).toMatchObject({ verdict: 'reject', reason: 'output-high-level', stepId: idOf('output-levels') });
    expect(steps.at(-1)!.stepId).toBe(idOf('output-levels'));
  });

  it('rejects before the trim where no setting meets all limits', () => {
    const limits = { ...cb1210.limits, hysteresisVolts: { min: 1.9, max: 2.2 } };
    const { ending } = predictSequence(cutoff, { ...cb1210, limits }, usualStation);
    expect(ending).toMatchObject({ verdict: 'reject', stepId: idOf('trim') });
  });

  it('ends without a verdict where the station lacks what a step needs', () => {
    const { ending } = predictSequence(cutoff, cb1210, { ...usualStation, hasController: false });
    expect(ending).toMatchObject({ verdict: 'no-verdict', stepId: idOf('ride-through') });
  });

  it('takes longer over a slow line', () => {
    const stationMs = (baudRate: 9600 | 115_200) => {
      const { totalMs, personMs } = predictSequence(cutoff, cb1210, { ...usualStation, baudRate });
      return totalMs - personMs;
    };
    expect(stationMs(9600)).toBeGreaterThan(1.5 * stationMs(115_200));
  });

  it('plays a branch so often as it may be taken', () => {
    const verify = idOf('verify');
    const branch = { kind: 'branch', quantity: 'trip-volts', is: 'above', value: 1, goTo: verify, mostTimes: 2 };
    const { steps, ending } = predictSequence(inserted(cutoff, idOf('output-levels'), branch), cb1210, usualStation);
    expect(steps.filter(({ stepId }) => stepId === verify)).toHaveLength(3);
    expect(ending.verdict).toBe('pass');
  });

  it('waits for a voltage as long as the step says', () => {
    const wait = { kind: 'apply-voltage', volts: 12.8, waitMs: 3000 };
    const { steps } = predictSequence(inserted(cutoff, idOf('output-levels'), wait), cb1210, usualStation);
    const added = steps.find(({ stepId }) => stepId === 'new-0')!;
    expect(added.stationMs).toBeGreaterThanOrEqual(3000);
    expect(added.stationMs).toBeLessThan(3600);
  });
});

import { describe, expect, it } from 'vitest';
import { cb0612, cb1210 } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import type { BoardType } from '@/lib/contracts/board-type';
import { usualStation } from '@/lib/prediction/types';
import { checkSequence } from '@/lib/sequence/check-sequence';
import { sequenceSchema, type DecisionRule, type Sequence, type Step } from '@/lib/sequence/step';
import { applied, before } from './change-steps';

export const whole = sequences[0]!.sequence;
export const measure = {
  id: 'm1',
  name: '',
  enabled: true,
  kind: 'measure-channel',
  channel: 102,
  atVolts: 13,
  settleMs: 60,
  integrationCycles: 1,
  minVolts: 11,
  maxVolts: 13,
} as const satisfies Step;
export const apply = { id: 'a1', name: '', enabled: true, kind: 'apply-voltage', volts: 12, waitMs: 500 } as const;
export const soak = {
  id: 'k1',
  name: '',
  enabled: true,
  kind: 'soak',
  channel: 103,
  atVolts: 13,
  readings: 20,
  everyMs: 500,
  mostDriftVolts: 0.005,
} as const satisfies Step;
export const tell = {
  id: 'i1',
  name: '',
  enabled: true,
  kind: 'instruction',
  text: 'Fit the clip.',
  pictureId: null,
  supplyOff: true,
} as const satisfies Step;
export const branch = {
  id: 'b1',
  name: '',
  enabled: true,
  kind: 'branch',
  quantity: 'trip-volts',
  is: 'below',
  value: 10.7,
  goTo: 's4',
  mostTimes: 2,
} as const satisfies Step;
export const idOf = (kind: Step['kind']) => whole.steps.find((s) => s.kind === kind)!.id;
export const within = (step: Step) => before(whole, 'record', step);
export const back = before(whole, 'output-levels', branch);

export interface Case {
  problem: string;
  field: string | null;
  severity: 'error' | 'warning';
  bad: Sequence;
  /** The nearest that is right. */
  good: Sequence;
  /** Words that the sentence has: its numbers. */
  says: string;
  /** Null: no single value puts it right. */
  mend: string | null;
  boardType?: BoardType;
}
export const rule = (decisionRule: DecisionRule, sequence = whole): Sequence => ({ ...sequence, decisionRule });
export const limits = (over: Partial<BoardType['limits']>): BoardType => ({
  ...cb1210,
  limits: { ...cb1210.limits, ...over },
});
export const fullSpan: BoardType = {
  ...cb0612,
  design: { ...cb0612.design, trimmerOhms: 10_000, supplyEndOhms: 0, groundEndOhms: 0 },
  limits: { ...cb0612.limits, tripVolts: { min: 10.8, max: 11.2 } },
};

const found = ({ problem, field, boardType = cb1210 }: Case, sequence: Sequence) =>
  checkSequence(sequence, boardType, usualStation).filter((f) => f.problem === problem && f.field === field);

/** Each rule is told where it is wrong, not where it is right, and is put right by its mend. */
export function tellRules(cases: readonly Case[]): void {
  describe.each(cases.map((each) => [`${each.problem} of ${each.field ?? 'a step'}`, each] as const))(
    '%s',
    (_, each) => {
      const [finding] = found(each, each.bad);
      it('is told where it is wrong, with its numbers', () => {
        expect(sequenceSchema.safeParse(each.bad).success).toBe(true);
        expect(finding).toMatchObject({ severity: each.severity, field: each.field });
        expect(finding!.sentence).toContain(each.says);
      });
      it('is not told where it is right', () => {
        const boardType = each.problem === 'release-outside-at-target' ? cb1210 : each.boardType;
        expect(found({ ...each, ...(boardType ? { boardType } : {}) }, each.good)).toEqual([]);
      });
      it('is put right by its mend, which leaves no new error', () => {
        expect(finding?.mend?.label ?? null).toBe(each.mend);
        if (!finding?.mend) return;
        const mended = applied(each.bad, finding.mend.changes);
        expect(sequenceSchema.safeParse(mended).success).toBe(true);
        expect(found(each, mended).filter(({ stepId }) => stepId === finding.stepId)).toEqual([]);
        const errors = (sequence: Sequence) =>
          checkSequence(sequence, each.boardType ?? cb1210).filter(({ severity }) => severity === 'error');
        expect(errors(mended).length).toBeLessThanOrEqual(errors(each.bad).length);
      });
    },
  );
}

import fc from 'fast-check';
import { cb1210 } from '@/db/seed/board-types';
import type { DecisionRule, Sequence, Step } from '@/lib/sequence/step';
import { stepKinds } from '@/lib/steps/step-kinds';

/** A number near the one that a new step of the kind has, or a choice left as it is. */
function anyLike(value: unknown): fc.Arbitrary<unknown> {
  if (typeof value === 'number' && Number.isInteger(value) && value >= 100 && value <= 110) return fc.constant(value);
  if (typeof value === 'number' && Number.isInteger(value)) return fc.constantFrom(value, value + 1, value + 2);
  if (typeof value === 'number') return fc.constantFrom(1, 1.25, 0.875, 1.0078125).map((factor) => value * factor);
  if (value !== null && typeof value === 'object' && !Array.isArray(value))
    return fc.record(Object.fromEntries(Object.entries(value).map(([key, each]) => [key, anyLike(each)])));
  return fc.constant(value);
}

/** A step of any kind that its schema takes. */
const anyStep = (id: string): fc.Arbitrary<Step> =>
  fc.constantFrom(...stepKinds).chain((kind) =>
    fc
      .record({
        id: fc.constant(id),
        name: fc.constantFrom('', 'Again', 'Öl & "Fett"'),
        enabled: fc.boolean(),
        own: anyLike(kind.fresh(cb1210)),
      })
      .map(({ own, ...common }) => ({ ...common, ...(own as object) }) as unknown as Step)
      .filter((step) => kind.schema.safeParse(step).success),
  );

const anyRule: fc.Arbitrary<DecisionRule> = fc.oneof(
  fc.constant<DecisionRule>({ kind: 'simple' }),
  fc.constantFrom(0, 0.5, 1, 1.5).map((factor): DecisionRule => ({ kind: 'guard-band', factor })),
);

/** Any sequence that the schema takes, right or not. Ids come from a small store, so that two sequences share some. */
export const anySequence: fc.Arbitrary<Sequence> = fc
  .shuffledSubarray(
    Array.from({ length: 12 }, (_, i) => `s${i + 1}`),
    { minLength: 2 },
  )
  .chain((ids) => fc.record({ steps: fc.tuple(...ids.map(anyStep)), decisionRule: anyRule }));

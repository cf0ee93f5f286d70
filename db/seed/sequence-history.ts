import type { Transaction } from '@/db/client';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { releaseMeanings } from '@/lib/contracts/sequence-draft';
import type { Sequence, Step, StepKind } from '@/lib/sequence/step';
import { daysFrom } from './days';
import type { SeededPeople } from './people';

type Maker = 'engineerId' | 'secondEngineerId';

/** A revision of the demo; days are before today. */
interface SeededRevision {
  data: Sequence;
  note: string;
  madeBy: Maker;
  madeDays: number;
  state: 'superseded' | 'released' | 'submitted' | 'draft';
}

const changed = (sequence: Sequence, changes: Partial<Record<StepKind, object>>): Sequence => ({
  ...sequence,
  steps: sequence.steps.map((step) => ({ ...step, ...changes[step.kind] }) as Step),
});

/** What a sequence of the demo went through; `inUse` is what its lots are tested by. */
export function historyOf(name: string, inUse: Sequence): SeededRevision[] {
  const first = { note: 'First release.', madeBy: 'engineerId', madeDays: 60 } as const;
  if (name === 'CB1210 cutoff trim')
    return [
      {
        ...first,
        data: changed(inUse, { trim: { toleranceVolts: 0.03 }, verify: { repeats: 2 } }),
        state: 'superseded',
      },
      {
        data: inUse,
        note: 'Boards from lot 2645 came back near the lower limit: closer trim, and verified three times.',
        madeBy: 'engineerId',
        madeDays: 24,
        state: 'released',
      },
      {
        // 30 ms is shorter than the supply needs: one warning, which nobody has given a reason for yet.
        data: changed(inUse, {
          'power-up': { currentLimitAmps: 0.25 },
          'find-points': { settleMs: 30 },
          trim: { toleranceVolts: 0.015 },
        }),
        note: '',
        madeBy: 'engineerId',
        madeDays: 2,
        state: 'draft',
      },
    ];
  if (name === 'CB2420 cutoff trim')
    return [
      { ...first, data: inUse, state: 'released' },
      {
        data: changed(inUse, { trim: { procedure: 'two-beeps', mostRounds: 6 }, verify: { repeats: 5 } }),
        note: 'Two beeps save the second measuring round; five repeats show a scratchy wiper.',
        madeBy: 'secondEngineerId',
        madeDays: 3,
        state: 'submitted',
      },
    ];
  return [{ ...first, data: inUse, state: 'released' }];
}

/** Stores the history of one sequence. Returns the id of the revision in use. */
export async function seedRevisions(
  tx: Transaction,
  {
    sequenceId,
    history,
    people,
    now,
  }: { sequenceId: string; history: SeededRevision[]; people: SeededPeople; now: Date },
): Promise<string> {
  let basedOnId: string | null = null;
  let inUse: string | null = null;
  for (const [index, { data, note, madeBy, madeDays, state }] of history.entries()) {
    const maker = people[madeBy];
    const submitted = state !== 'draft';
    const released = state === 'released' || state === 'superseded';
    const [row]: { id: string }[] = await tx
      .insert(sequenceRevisions)
      .values({
        sequenceId,
        number: index + 1,
        data,
        status: state,
        note,
        madeBy: maker,
        madeAt: daysFrom(now, -madeDays),
        basedOnId,
        version: index === 0 ? 1 : 5,
        savedAt: daysFrom(now, -madeDays + 1),
        savedBy: maker,
        editedBy: [maker],
        submittedBy: submitted ? maker : null,
        submittedAt: submitted ? daysFrom(now, -madeDays + 2) : null,
        releasedBy: released ? people[madeBy === 'engineerId' ? 'secondEngineerId' : 'engineerId'] : null,
        releasedAt: released ? daysFrom(now, -madeDays + 3) : null,
        releaseMeaning: released ? releaseMeanings[0].words : null,
        supersededAt: state === 'superseded' ? daysFrom(now, -history[index + 1]!.madeDays + 3) : null,
      })
      .returning({ id: sequenceRevisions.id });
    basedOnId = row!.id;
    if (state === 'released') inUse = row!.id;
  }
  return inUse!;
}

import type { Transaction } from '@/db/client';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes as boardTypeTable } from '@/db/schema/board-types';
import { sequences as sequenceTable } from '@/db/schema/sequences';
import { boardTypeSchema } from '@/lib/contracts/board-type';
import { sequenceSchema, type Sequence } from '@/lib/sequence/step';
import { boardTypes } from './board-types';
import { daysFrom } from './days';
import { demoPictures } from './demo-pictures';
import type { SeededPeople } from './people';
import { historyOf, seedRevisions } from './sequence-history';
import { sequences } from './sequences';

export interface SeededProducts {
  boardTypeIds: Record<string, string>;
  boardTypeRevisionIds: Record<string, string>;
  /** The revision in use, by the sequence's name. */
  sequenceRevisionIds: Record<string, string>;
}

/** For stations without a fixture controller, which cannot interrupt the supply for milliseconds. */
const withoutController = ', without controller';

function withoutRideThrough(sequence: Sequence): Sequence {
  return { ...sequence, steps: sequence.steps.filter((step) => step.kind !== 'ride-through') };
}

/** Board types approved by quality, sequences released by another engineer than their maker. */
export async function seedProducts(tx: Transaction, people: SeededPeople, now: Date): Promise<SeededProducts> {
  const made: SeededProducts = { boardTypeIds: {}, boardTypeRevisionIds: {}, sequenceRevisionIds: {} };
  for (const boardType of boardTypes) {
    const { code, name } = boardType;
    const [type] = await tx.insert(boardTypeTable).values({ code, name }).returning();
    const [revision] = await tx
      .insert(boardTypeRevisions)
      .values({
        boardTypeId: type!.id,
        number: 1,
        specification: boardTypeSchema.parse({ ...boardType, ...demoPictures[code] }),
        status: 'approved',
        madeBy: people.engineerId,
        madeAt: daysFrom(now, -90),
        approvedBy: people.qualityId,
        approvedAt: daysFrom(now, -88),
      })
      .returning();
    made.boardTypeIds[code] = type!.id;
    made.boardTypeRevisionIds[code] = revision!.id;
  }
  const first = sequences[0]!;
  const all = [
    ...sequences,
    { ...first, name: first.name + withoutController, sequence: withoutRideThrough(first.sequence) },
  ];
  for (const { name, boardTypeCode, sequence } of all) {
    const [row] = await tx
      .insert(sequenceTable)
      .values({ boardTypeId: made.boardTypeIds[boardTypeCode]!, name })
      .returning();
    const history = historyOf(name, sequenceSchema.parse(sequence));
    const inUse = await seedRevisions(tx, { sequenceId: row!.id, history, people, now });
    made.sequenceRevisionIds[name] = inUse;
  }
  return made;
}

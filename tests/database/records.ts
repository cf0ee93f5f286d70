import type { Database } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { lots } from '@/db/schema/lots';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';
import { stations } from '@/db/schema/stations';
import { units } from '@/db/schema/units';
import type { Role } from '@/lib/access/roles';
import type { BoardType } from '@/lib/contracts/board-type';
import type { Sequence } from '@/lib/sequence/step';

/** Smallest rows that the schema takes, for tests of what the tables refuse. */

let made = 0;

export async function insertAccount(db: Database, roles: Role[], over: Partial<typeof accounts.$inferInsert> = {}) {
  const [row] = await db
    .insert(accounts)
    .values({ name: `Person ${++made}`, roles, ...over })
    .returning();
  return row!;
}

export async function insertStation(db: Database, over: Partial<typeof stations.$inferInsert> = {}) {
  const n = ++made;
  const [row] = await db
    .insert(stations)
    .values({
      code: `S${n}`,
      name: `Station ${n}`,
      fixture: `F${n}`,
      binCode: `BIN-${n}`,
      link: { kind: 'simulated', seed: n, baudRate: 115_200, hasController: true },
      ...over,
    })
    .returning();
  return row!;
}

/** A lot of `size` units with an approved specification and a released sequence. The specification is not a real one. */
export async function insertLot(db: Database, size = 3) {
  const n = ++made;
  const maker = await insertAccount(db, ['test-engineer']);
  const other = await insertAccount(db, ['quality-manager']);
  const [type] = await db
    .insert(boardTypes)
    .values({ code: `CB${n}`, name: `Board ${n}` })
    .returning();
  const [revision] = await db
    .insert(boardTypeRevisions)
    .values({
      boardTypeId: type!.id,
      number: 1,
      specification: {} as BoardType,
      status: 'approved',
      madeBy: maker.id,
      approvedBy: other.id,
      approvedAt: new Date(),
    })
    .returning();
  const [sequence] = await db.insert(sequences).values({ boardTypeId: type!.id, name: 'End of line' }).returning();
  const [sequenceRevision] = await db
    .insert(sequenceRevisions)
    .values({
      sequenceId: sequence!.id,
      number: 1,
      data: {} as Sequence,
      status: 'released',
      madeBy: maker.id,
      releasedBy: other.id,
      releasedAt: new Date(),
    })
    .returning();
  const [lot] = await db
    .insert(lots)
    .values({
      code: `L${n}`,
      boardTypeRevisionId: revision!.id,
      sequenceRevisionId: sequenceRevision!.id,
      size,
      createdBy: maker.id,
    })
    .returning();
  const boards = await db
    .insert(units)
    .values(Array.from({ length: size }, (_, i) => ({ serial: `L${n}-${i + 1}`, lotId: lot!.id, position: i + 1 })))
    .returning();
  return {
    lot: lot!,
    units: boards,
    boardType: type!,
    boardTypeRevision: revision!,
    sequenceRevision: sequenceRevision!,
  };
}

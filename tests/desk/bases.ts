import type { Database } from '@/db/client';
import type { accounts } from '@/db/schema/accounts';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';
import type { Actor } from '@/lib/access/actor';
import type { BoardType } from '@/lib/contracts/board-type';
import type { Sequence } from '@/lib/sequence/step';
import { insertAccount } from '../database/records';

/** Whoever acts at a desk, as an operation takes them. */
export function actorOf(account: typeof accounts.$inferSelect): Actor {
  return {
    sessionId: '00000000-0000-4000-8000-000000000000',
    sessionKind: 'desk',
    accountId: account.id,
    name: account.name,
    operatorNumber: account.operatorNumber,
    roles: account.roles,
    locale: account.locale,
    stationId: null,
  };
}

let made = 0;

/** Board type CB1210 with an approved specification, and sequence r6 of it. */
export async function insertReleasedSequence(db: Database, over: { status?: 'draft' } = {}) {
  const maker = await insertAccount(db, ['test-engineer']);
  const other = await insertAccount(db, ['quality-manager']);
  const suffix = made++ === 0 ? '' : String(made);
  const [type] = await db
    .insert(boardTypes)
    .values({ code: `CB1210${suffix}`, name: '12 V 10 A' })
    .returning();
  const specification = {
    code: 'CB1210',
    name: '12 V 10 A',
    serialPattern: '^CB1210\\d{9}$',
    mostAttempts: 3,
  } as BoardType;
  const [boardTypeRevision] = await db
    .insert(boardTypeRevisions)
    .values({
      boardTypeId: type!.id,
      number: 1,
      specification,
      status: 'approved',
      madeBy: maker.id,
      approvedBy: other.id,
      approvedAt: new Date(),
    })
    .returning();
  const [sequence] = await db.insert(sequences).values({ boardTypeId: type!.id, name: 'End of line' }).returning();
  const released = { status: 'released', releasedBy: other.id, releasedAt: new Date() } as const;
  const [sequenceRevision] = await db
    .insert(sequenceRevisions)
    .values({
      sequenceId: sequence!.id,
      number: 6,
      data: { steps: [] } as unknown as Sequence,
      madeBy: maker.id,
      ...(over.status ? { status: over.status } : released),
    })
    .returning();
  return { boardType: type!, boardTypeRevision: boardTypeRevision!, sequenceRevision: sequenceRevision! };
}

import { eq, inArray } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { lots } from '@/db/schema/lots';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';
import { units } from '@/db/schema/units';

/** The lot of a certificate's board, or the lot itself, with what its heading says. */
export async function findCertificateLot(db: Database | Transaction, subject: { unitId: string } | { lotId: string }) {
  const which =
    'lotId' in subject
      ? eq(lots.id, subject.lotId)
      : inArray(lots.id, db.select({ id: units.lotId }).from(units).where(eq(units.id, subject.unitId)));
  const [row] = await db
    .select({
      id: lots.id,
      code: lots.code,
      state: lots.state,
      heldAt: lots.heldAt,
      holdReason: lots.holdReason,
      boardTypeCode: boardTypes.code,
      boardTypeName: boardTypes.name,
      sequenceName: sequences.name,
    })
    .from(lots)
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .innerJoin(boardTypes, eq(boardTypes.id, boardTypeRevisions.boardTypeId))
    .innerJoin(sequenceRevisions, eq(sequenceRevisions.id, lots.sequenceRevisionId))
    .innerJoin(sequences, eq(sequences.id, sequenceRevisions.sequenceId))
    .where(which);
  return row ?? null;
}

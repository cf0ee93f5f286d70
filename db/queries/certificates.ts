import { and, desc, eq, ilike, isNull, like, or, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { certificates } from '@/db/schema/certificates';
import { lots } from '@/db/schema/lots';
import { signatures } from '@/db/schema/signatures';
import { units } from '@/db/schema/units';

type Reader = Database | Transaction;

export type Certificate = typeof certificates.$inferSelect;

/** Whether a certificate covers the unit of `u`. */
const covers = sql`(${certificates.unitId} = u.id or ${certificates.unitId} is null
  and ${certificates.content} -> 'boards' @> jsonb_build_array(jsonb_build_object('serial', u.serial)))`;

/** What happened to its board or lot since; null or false: nothing. A retest order ends with the run that gives a verdict. */
const since = {
  newerAt: sql<Date | null>`(select min(later.issued_at) from certificates later
    where later.lot_id = ${certificates.lotId} and later.unit_id is not distinct from ${certificates.unitId}
      and later.issued_at > ${certificates.issuedAt})`.mapWith(certificates.issuedAt),
  testedAgainAt: sql<Date | null>`(select min(r.ended_at) from runs r join units u on u.id = r.unit_id
    where r.lot_id = ${certificates.lotId} and r.kind = 'production' and r.verdict in ('pass', 'reject')
      and r.ended_at > ${certificates.issuedAt} and ${covers})`.mapWith(certificates.issuedAt),
  retestOrdered: sql<boolean>`exists (select 1 from retest_orders o join units u on u.id = o.unit_id
    where u.lot_id = ${certificates.lotId} and o.signed_at > ${certificates.issuedAt} and ${covers})`,
};

const rows = (db: Reader) =>
  db
    .select({
      id: certificates.id,
      number: certificates.number,
      unitId: certificates.unitId,
      lotId: certificates.lotId,
      serial: units.serial,
      lotCode: lots.code,
      lotHeldAt: lots.heldAt,
      boardTypeCode: boardTypes.code,
      issuedAt: certificates.issuedAt,
      issuedByName: signatures.name,
      digest: signatures.digest,
      revokedAt: certificates.revokedAt,
      revokedReason: certificates.revokedReason,
      ...since,
    })
    .from(certificates)
    .innerJoin(lots, eq(lots.id, certificates.lotId))
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .innerJoin(boardTypes, eq(boardTypes.id, boardTypeRevisions.boardTypeId))
    .innerJoin(signatures, eq(signatures.id, certificates.signatureId))
    .leftJoin(units, eq(units.id, certificates.unitId))
    .$dynamic();

export type CertificateFacts = Awaited<ReturnType<typeof rows>>[number];

/** Of a board, or of the whole lot without its boards'; newest first. */
export function listCertificatesOf(
  db: Reader,
  subject: { unitId: string } | { lotId: string },
): Promise<CertificateFacts[]> {
  const which =
    'unitId' in subject
      ? eq(certificates.unitId, subject.unitId)
      : and(eq(certificates.lotId, subject.lotId), isNull(certificates.unitId));
  return rows(db).where(which).orderBy(desc(certificates.issuedAt));
}

/** Whose number, serial number or lot contains the text, newest first. Null: any. */
export function searchCertificates(db: Reader, text: string | null, most: number): Promise<CertificateFacts[]> {
  const escaped = `%${(text ?? '').replace(/[\\%_]/g, (mark) => `\\${mark}`)}%`;
  const which = text
    ? or(ilike(certificates.number, escaped), ilike(units.serial, escaped), ilike(lots.code, escaped))
    : undefined;
  return rows(db).where(which).orderBy(desc(certificates.issuedAt)).limit(most);
}

/** By what the code on the paper carries, with all that is printed. */
export async function findCertificateByToken(db: Reader, tokenHash: string) {
  const [facts] = await rows(db).where(eq(certificates.tokenHash, tokenHash));
  if (!facts) return null;
  const [kept] = await db
    .select({ content: certificates.content, tokenHash: certificates.tokenHash })
    .from(certificates)
    .where(eq(certificates.id, facts.id));
  return { ...facts, ...kept! };
}

export async function findCertificate(db: Reader, id: string): Promise<Certificate | null> {
  const [row] = await db.select().from(certificates).where(eq(certificates.id, id));
  return row ?? null;
}

export async function findCertificateForUpdate(tx: Transaction, id: string): Promise<Certificate | null> {
  const [row] = await tx.select().from(certificates).where(eq(certificates.id, id)).for('update');
  return row ?? null;
}

/** Numbers given so far that begin so. */
export async function listNumbers(db: Reader, stem: string): Promise<string[]> {
  const escaped = stem.replace(/[\\%_]/g, (mark) => `\\${mark}`);
  const found = await db
    .select({ number: certificates.number })
    .from(certificates)
    .where(like(certificates.number, `${escaped}-%`));
  return found.map(({ number }) => number);
}

export async function insertCertificate(
  tx: Transaction,
  values: typeof certificates.$inferInsert,
): Promise<{ id: string }> {
  const [row] = await tx.insert(certificates).values(values).returning({ id: certificates.id });
  return row!;
}

export async function revokeOnce(
  tx: Transaction,
  id: string,
  revoked: { revokedAt: Date; revokedBy: string; revokedReason: string },
): Promise<void> {
  await tx.update(certificates).set(revoked).where(eq(certificates.id, id));
}

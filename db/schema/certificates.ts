import { sql } from 'drizzle-orm';
import { check, index, jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import type { CertificateContent } from '@/lib/contracts/certificate';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';
import { lots } from './lots';
import { signatures } from './signatures';
import { units } from './units';

/** A certificate that was issued, for a board or a lot, as it was issued. Changed in nothing but its one revocation. */
export const certificates = pgTable(
  'certificates',
  {
    id: id(),
    /** Printed: 2648-B-00042-2. */
    number: text().notNull().unique(),
    /** Null: of a whole lot. */
    unitId: uuid().references(() => units.id),
    lotId: uuid()
      .notNull()
      .references(() => lots.id),
    content: jsonb().$type<CertificateContent>().notNull(),
    /** Hexadecimal SHA-256 of the 128-bit token in its code; the token itself is only on the paper and in the PDF. */
    tokenHash: text().notNull().unique(),
    /** Key of the PDF in object storage, and its SHA-256. */
    storageKey: text().notNull(),
    sha256: text().notNull(),
    issuedBy: uuid()
      .notNull()
      .references(() => accounts.id),
    issuedAt: momentNow(),
    signatureId: uuid()
      .notNull()
      .references(() => signatures.id),
    /** Null: not revoked. */
    revokedAt: moment(),
    revokedBy: uuid().references(() => accounts.id),
    revokedReason: text(),
  },
  (t) => [
    index().on(t.unitId),
    index().on(t.lotId),
    check('certificates_revoked_whole', sql`(${t.revokedAt} is null) = (${t.revokedReason} is null)`),
  ],
);

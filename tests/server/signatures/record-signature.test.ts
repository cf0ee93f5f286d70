import { afterAll, beforeAll, expect, test } from 'vitest';
import { sql } from 'drizzle-orm';
import { listSignatures } from '@/db/queries/signatures';
import { digestOf, recordSignature, signatureHolds } from '@/server/operations/signatures/record-signature';
import { insertAccount } from '../../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../../database/temporary-postgres';

let open: TemporaryDatabase;
beforeAll(async () => {
  open = await temporaryDatabase();
});
afterAll(() => open.close());

const content = { kind: 'scrap', serial: 'CB1210264800042', reason: 'Track burnt', volts: 10.61 };

async function signed() {
  const account = await insertAccount(open.db, ['quality-manager']);
  const subjectId = crypto.randomUUID();
  await open.db.transaction((tx) =>
    recordSignature(
      tx,
      { accountId: account.id, name: account.name },
      { subject: 'disposition', subjectId, meaning: 'The board is scrapped.', content },
    ),
  );
  const [row] = await listSignatures(open.db, 'disposition', subjectId);
  return row!;
}

test('a signature holds name, words and exactly what was signed, and still fits when read back', async () => {
  const row = await signed();
  expect(row.content).toEqual(content);
  expect(signatureHolds(row)).toBe(true);
});

test('anything else than what was signed does not fit', async () => {
  const row = await signed();
  expect(signatureHolds({ ...row, content: { ...row.content, volts: 10.62 } })).toBe(false);
  expect(signatureHolds({ ...row, content: { ...row.content, more: null } })).toBe(false);
});

test('the order of the members is not part of what is signed', () => {
  expect(digestOf({ a: 1, b: 2 })).toBe(digestOf({ b: 2, a: 1 }));
});

test('a signature cannot be changed or removed', async () => {
  const { id } = await signed();
  for (const statement of [
    sql`update signatures set name = 'x' where id = ${id}`,
    sql`delete from signatures where id = ${id}`,
  ])
    await expect(open.db.execute(statement)).rejects.toMatchObject({ cause: { code: 'SW002' } });
});

import { createHash } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { eq, like } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { listUnitRecordsOfLot, type UnitRecord } from '@/db/queries/unit-records';
import { accounts } from '@/db/schema/accounts';
import { certificates } from '@/db/schema/certificates';
import { dispositions } from '@/db/schema/dispositions';
import { lots } from '@/db/schema/lots';
import { signatures } from '@/db/schema/signatures';
import { stations } from '@/db/schema/stations';
import { trail } from '@/db/schema/trail';
import { seedBenches } from '@/db/seed/benches';
import { seedFinishedLot } from '@/db/seed/finished-lot';
import { seedPeople } from '@/db/seed/people';
import { seedProducts } from '@/db/seed/products';
import type { Actor } from '@/lib/access/actor';
import type { Outcome } from '@/lib/contracts/outcome';
import { boardStanding, type BoardStanding } from '@/lib/decision/board-standing';
import { startFakeStorage, type FakeStorage } from '@/server/files/storage/fake-storage';
import { issueCertificate } from '@/server/operations/certificates/issue-certificate';
import { listCertificates, listCertificatesFor } from '@/server/operations/certificates/list-certificates';
import { readCertificatePdf } from '@/server/operations/certificates/read-certificate-pdf';
import { revokeCertificate } from '@/server/operations/certificates/revoke-certificate';
import { verifyCertificate } from '@/server/operations/certificates/verify-certificate';
import { holdLot, releaseLot } from '@/server/operations/lots/hold-lot';
import { completeConcession } from '@/server/operations/units/complete-concession';
import { orderRetest } from '@/server/operations/units/order-retest';
import { signDispositions } from '@/server/operations/units/sign-dispositions';
import { temporaryDatabase, type TemporaryDatabase } from '../../database/temporary-postgres';
import { actorOf } from '../../desk/bases';
import { insertRun } from '../../desk/runs';
import { readCode128, readQrCodes } from '../../lib/barcode/read-barcode';
import { readPdf, type ReadPage } from '../files/read-pdf';

const now = new Date('2026-11-28T09:00:00Z');
const password = 'gauge jaws demo';
const folder = mkdtempSync(join(tmpdir(), 'sillwright-certificates-'));
let open: TemporaryDatabase;
let storage: FakeStorage;
let quality: Actor;
let engineer: Actor;
let lot: typeof lots.$inferSelect;
let records: UnitRecord[];
let minute = 0;

beforeAll(async () => {
  storage = await startFakeStorage(folder);
  Object.assign(process.env, storage.variables);
  open = await temporaryDatabase();
  await open.db.transaction(async (tx) => {
    const people = await seedPeople(tx);
    const products = await seedProducts(tx, people, now);
    await seedBenches(tx, people, products, now);
    await seedFinishedLot(tx, people, products, now);
  });
  const person = async (email: string) =>
    actorOf(
      (
        await open.db
          .select()
          .from(accounts)
          .where(like(accounts.email, `${email}%`))
      )[0]!,
    );
  quality = await person('a.boyle');
  engineer = await person('t.marsden');
  lot = (await open.db.select().from(lots).where(like(lots.code, '%-00')))[0]!;
  records = await listUnitRecordsOfLot(open.db, lot.id);
}, 60_000);
afterAll(async () => {
  await open.close();
  await storage.close();
  rmSync(folder, { recursive: true });
});

const value = <T>(outcome: Outcome<T>): T => {
  if (!outcome.ok) throw new Error(outcome.sentence);
  return outcome.value;
};
/** A moment later than all before. */
const later = () => new Date(now.getTime() + ++minute * 60_000);
const standingIs =
  (kind: BoardStanding['kind'], runs = 1) =>
  (record: UnitRecord) =>
    boardStanding(record).kind === kind && record.runs.length === runs;
const issue = (subject: { unitId: string } | { lotId: string }) =>
  issueCertificate(quality, { ...subject, password }, later());

async function paperOf(id: string): Promise<{ pages: ReadPage[]; token: string; bytes: Buffer }> {
  const { body } = (await readCertificatePdf(id))!;
  const bytes = Buffer.from(await new Response(body).arrayBuffer());
  const pages = await readPdf(bytes);
  const [address] = await readQrCodes(pages[0]!.picture());
  return { pages, token: address!.replace(/^.*\/verify\//, ''), bytes };
}

describe('a certificate of a board', () => {
  test('says by text, barcode and QR code what is on record; its token is kept as a hash only', async () => {
    const board = records.find(standingIs('passed', 2))!;
    const { id, number } = value(await issue({ unitId: board.unitId }));
    expect(number).toBe(`${lot.code}-${board.serial.slice(-5)}-1`);
    const { pages, token, bytes } = await paperOf(id);
    expect(pages).toHaveLength(1);
    const { text, picture } = pages[0]!;
    for (const said of [
      `Certificate ${number}, page 1 of 1`,
      'This board met all limits of sequence',
      'It was the second attempt. Attempt 1 was rejected:',
      '10.70–10.90',
      'Multimeter DM',
      'calibrated',
      'It does not claim that a board is safe.',
      'Issued by A. Boyle, quality',
    ])
      expect(text).toContain(said);
    expect(await readCode128(picture())).toEqual([board.serial]);
    expect(token).toMatch(/^[\w-]{22}$/);
    const [row] = await open.db.select().from(certificates).where(eq(certificates.id, id));
    expect(row).toMatchObject({
      tokenHash: createHash('sha256').update(token).digest('hex'),
      sha256: createHash('sha256').update(bytes).digest('hex'),
    });
    const kept = JSON.stringify([await open.db.select().from(signatures), await open.db.select().from(trail), row]);
    expect(kept).not.toContain(token);
    const trip = row!.content.boards[0]!.values.find(({ quantity }) => quantity === 'trip-volts')!;
    expect(trip).toMatchObject({ min: 10.7, max: 10.9, passed: true });
    expect(row!.content.benches[0]!.instruments.map(({ role }) => role)).toContain('supply');
    expect(await verifyCertificate(token)).toMatchObject({
      number,
      issuedByName: 'A. Boyle',
      validity: { kind: 'valid' },
      content: { kind: 'board', boards: [{ serial: board.serial, attempt: 2 }] },
    });
  });

  test('is refused where the newest result is a reject, and with a wrong password', async () => {
    const rejected = records.find(({ runs }) => runs.at(-1)?.verdict === 'reject')!;
    expect(await issue({ unitId: rejected.unitId })).toMatchObject({ ok: false, code: 'board-not-passed' });
    const { unitId } = records.find(standingIs('passed'))!;
    expect(await issueCertificate(quality, { unitId, password: 'guess' })).toMatchObject({
      code: 'wrong-password',
      field: 'password',
    });
    expect(await issue({ unitId: '00000000-0000-4000-8000-000000000000' })).toMatchObject({ code: 'unit-unknown' });
    expect(await listCertificatesFor({ unitId })).toEqual([]);
  });

  test('issued anew has the next copy number, and the first paper says that it is replaced', async () => {
    const { unitId } = records.filter(standingIs('passed'))[1]!;
    const first = value(await issue({ unitId }));
    const { token } = await paperOf(first.id);
    const second = value(await issue({ unitId }));
    expect([first.number.slice(-2), second.number.slice(-2)]).toEqual(['-1', '-2']);
    expect((await verifyCertificate(token))!.validity).toMatchObject({
      kind: 'replaced',
      because: 'newer-certificate',
    });
    const rows = await listCertificatesFor({ unitId });
    expect(rows.map(({ validity }) => validity.kind)).toEqual(['valid', 'replaced']);
    expect((await listCertificates(second.number)).map(({ id }) => id)).toEqual([second.id]);
  });

  test('counts no longer once revoked, with day and reason; a second time is refused', async () => {
    const { unitId } = records.filter(standingIs('passed'))[2]!;
    const { id } = value(await issue({ unitId }));
    const { token } = await paperOf(id);
    const asked = { certificateId: id, reason: 'The customer has another limit.', password };
    expect(await revokeCertificate(quality, { ...asked, password: 'guess' })).toMatchObject({ code: 'wrong-password' });
    value(await revokeCertificate(quality, asked, later()));
    expect((await verifyCertificate(token))!.validity).toMatchObject({
      kind: 'revoked',
      reason: 'The customer has another limit.',
    });
    expect(await revokeCertificate(quality, asked)).toMatchObject({ code: 'certificate-revoked' });
  });

  test('is under review while a retest is ordered, and replaced once the board was tested again', async () => {
    const board = records.filter(standingIs('passed'))[3]!;
    const { unitId, serial } = board;
    const { id } = value(await issue({ unitId }));
    const { token } = await paperOf(id);
    value(await orderRetest(quality, { unitId, reason: 'The customer asks.', password }, later()));
    expect((await verifyCertificate(token))!.validity).toEqual({ kind: 'under-review', because: 'board-waits' });
    expect(await issue({ unitId })).toMatchObject({ code: 'board-not-passed' });
    const [station] = await open.db.select().from(stations);
    const at = { unit: { id: unitId, serial, lotId: lot.id }, stationId: station!.id, operatorId: quality.accountId };
    await insertRun(open.db, { ...at, attempt: 2, minute: 5, ending: { verdict: 'pass' } });
    expect((await verifyCertificate(token))!.validity).toMatchObject({ kind: 'replaced', because: 'tested-again' });
  });

  test('by concession says so with both signatures, and that a value lies outside', async () => {
    const board = records.find(
      (record) => standingIs('needs-disposition')(record) && /^(trip|release)/.test(record.runs[0]!.rejectReason ?? ''),
    )!;
    const { unitId } = board;
    const runId = board.runs.at(-1)!.id;
    const reason = 'The customer accepts it in writing.';
    value(
      await signDispositions(
        quality,
        { boards: [{ unitId, runId }], kind: 'concession', action: '', reasonCodeId: null, reason, password },
        later(),
      ),
    );
    expect(await issue({ unitId })).toMatchObject({ code: 'board-not-passed' });
    const [given] = await open.db.select().from(dispositions).where(eq(dispositions.unitId, unitId));
    const [first] = await open.db.select().from(signatures).where(eq(signatures.id, given!.signatureId!));
    value(await completeConcession(engineer, { dispositionId: given!.id, digest: first!.digest, password }, later()));
    const { id } = value(await issue({ unitId }));
    const { pages } = await paperOf(id);
    const text = pages.map((page) => page.text).join(' ');
    expect(text).toContain('This board did not meet all limits of sequence');
    expect(text).toContain('by concession: the customer accepts it in writing.');
    expect(text).toContain('outside its limits');
    expect(text).toMatch(/concession signed by A\. Boyle \(.{10}\) and T\. Marsden/);
  });
});

describe('a certificate of a lot', () => {
  test('waits until the lot is complete or closed, then lists every board that it covers', async () => {
    await open.db.update(lots).set({ state: 'open', closedAt: null }).where(eq(lots.id, lot.id));
    expect(await issue({ lotId: lot.id })).toMatchObject({ code: 'lot-not-complete' });
    await open.db.update(lots).set({ state: 'closed', closedAt: now }).where(eq(lots.id, lot.id));
    const { id, number } = value(await issue({ lotId: lot.id }));
    expect(number).toBe(`${lot.code}-LOT-1`);
    const [row] = await open.db.select().from(certificates).where(eq(certificates.id, id));
    const { boards, counts } = row!.content;
    // Ten rejects, and the board whose retest is ordered above.
    expect(counts).toEqual({ boards: 240, firstPass: 216, laterPass: 12, concessions: 1, apart: 11 });
    expect(boards).toHaveLength(229);
    const { pages, token } = await paperOf(id);
    expect(pages).toHaveLength(6);
    const text = pages.map((page) => page.text).join(' ');
    for (const { serial } of boards) expect(text).toContain(serial);
    expect(text).toContain('240 boards of CB1210 were made in this lot.');
    expect(await readCode128(pages[0]!.picture())).toEqual([lot.code]);
    expect((await verifyCertificate(token))!.validity).toEqual({ kind: 'valid' });
  }, 30_000);

  test('is not issued while the lot is on hold, and one that was is under review until the release', async () => {
    const { unitId } = records.filter(standingIs('passed'))[4]!;
    const { id } = value(await issue({ unitId }));
    const { token } = await paperOf(id);
    value(await holdLot(quality, lot.id, 'The trip points drift.', later()));
    for (const subject of [{ unitId }, { lotId: lot.id }]) {
      const refused = await issue(subject);
      expect(refused).toMatchObject({ ok: false, code: 'lot-held' });
      expect(!refused.ok && refused.sentence).toContain('The trip points drift.');
    }
    expect((await verifyCertificate(token))!.validity).toEqual({ kind: 'under-review', because: 'lot-held' });
    expect(JSON.stringify(await verifyCertificate(token))).not.toContain('drift');
    value(await releaseLot(quality, { lotId: lot.id, reason: 'The meter was changed.', password }, later()));
    expect((await verifyCertificate(token))!.validity).toEqual({ kind: 'valid' });
  });
});

test.each(['', 'x', 'A'.repeat(22), `${'A'.repeat(21)}%`, 'A'.repeat(5_000)])(
  'nothing is shown for the code %#, which was never given',
  async (token) => {
    expect(await verifyCertificate(token)).toBeNull();
  },
);

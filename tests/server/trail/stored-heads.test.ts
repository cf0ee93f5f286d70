import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { sql } from 'drizzle-orm';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { insertTrail } from '@/db/queries/trail';
import { startFakeStorage, type FakeStorage } from '@/server/files/storage/fake-storage';
import { openObjectStore, type ObjectStore } from '@/server/files/storage/object-store';
import { readStoredHeads } from '@/server/operations/trail/stored-heads';
import { startTrailKeeper } from '@/server/operations/trail/trail-keeper';
import { verifyTrail } from '@/server/operations/trail/verify-trail';
import { writeCheckpoints } from '@/server/operations/trail/write-checkpoints';
import { temporaryDatabase, type TemporaryDatabase } from '../../database/temporary-postgres';

let open: TemporaryDatabase;
let fake: FakeStorage;
let store: ObjectStore;
const folder = mkdtempSync(join(tmpdir(), 'sillwright-heads-'));

const entry = (n: number) => ({ action: 'lot.held', entity: 'lot', entityId: `lot-${n}`, reason: `reason ${n}` });

beforeAll(async () => {
  open = await temporaryDatabase();
  fake = await startFakeStorage(folder);
  store = openObjectStore({
    endpoint: fake.variables.S3_ENDPOINT,
    region: 'eu-west-1',
    bucket: fake.variables.S3_BUCKET,
    accessKeyId: fake.variables.S3_ACCESS_KEY_ID,
    secretAccessKey: fake.variables.S3_SECRET_ACCESS_KEY,
  });
  for (let n = 1; n <= 4; n++) await insertTrail(open.db, null, entry(n));
});
afterAll(async () => {
  await open.close();
  await fake.close();
  rmSync(folder, { recursive: true, force: true });
});

test('heads kept in object storage show a trail that was written anew together with its checkpoints', async () => {
  await writeCheckpoints(open.db, store, new Date('2026-11-30T23:50:00Z'));
  const known = await readStoredHeads(store, new Date('2026-12-01T09:00:00Z'));
  expect(known).toMatchObject([{ chain: 'desk', place: 4, from: 'object storage, trail/2026-11-30.json' }]);
  expect((await verifyTrail(open.db, { known })).breaks).toEqual([]);

  await open.db.execute(sql`alter table trail disable trigger user`);
  await open.db.execute(sql`truncate trail, trail_checkpoints restart identity`);
  await open.db.execute(sql`alter table trail enable trigger user`);
  for (let n = 1; n <= 6; n++) await insertTrail(open.db, null, entry(n + 10));
  expect((await verifyTrail(open.db)).breaks).toEqual([]);
  const { breaks } = await verifyTrail(open.db, { known });
  expect(breaks[0]).toMatchObject({ chain: 'desk', place: 4 });
  expect(breaks[0]!.sentence).toContain('object storage');
});

test('the keeper keeps heads when none was kept for a day, and none twice', async () => {
  const warned: object[] = [];
  const log = { warn: (details: object) => void warned.push(details) };
  for (let i = 0; i < 2; i++) await startTrailKeeper({ db: open.db, store, log }).stop();
  const { rows } = await open.db.execute(sql`select chain, place::int as place, storage_key from trail_checkpoints`);
  expect(rows).toEqual([{ chain: 'desk', place: 6, storage_key: expect.stringMatching(/^trail\/.*json$/) }]);
  expect(warned).toEqual([]);
});

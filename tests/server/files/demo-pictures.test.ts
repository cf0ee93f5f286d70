import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { demoPictures } from '@/db/seed/demo-pictures';
import { demoMailDomain } from '@/db/seed/demo-accounts';
import { boardTypeSchema } from '@/lib/contracts/board-type';
import { cb1210 } from '@/db/seed/board-types';
import { storeDemoPictures } from '@/server/demo-pictures';
import { startFakeStorage } from '@/server/files/storage/fake-storage';
import { readFile } from '@/server/operations/files/read-file';
import { insertAccount } from '../../database/records';
import { temporaryDatabase } from '../../database/temporary-postgres';

const folder = mkdtempSync(join(tmpdir(), 'sillwright-demo-'));
afterAll(() => rmSync(folder, { recursive: true }));

test('the demo’s pictures are stored under the ids that its board type refers to, once', async () => {
  const storage = await startFakeStorage(folder);
  Object.assign(process.env, storage.variables);
  const open = await temporaryDatabase();
  await insertAccount(open.db, ['test-engineer'], { email: `t.marsden@${demoMailDomain}` });
  await storeDemoPictures();
  await storeDemoPictures();
  const { trimmerPhoto, fixtureDrawing } = demoPictures.CB1210!;
  expect(boardTypeSchema.parse({ ...cb1210, ...demoPictures.CB1210 })).toMatchObject({ trimmerPhoto, fixtureDrawing });
  for (const { fileId } of [trimmerPhoto!, fixtureDrawing!]) {
    const found = await readFile(fileId);
    expect(found!.file.mediaType).toBe('image/webp');
    expect((await new Response(found!.body).arrayBuffer()).byteLength).toBe(found!.file.bytes);
  }
  await open.close();
  await storage.close();
});

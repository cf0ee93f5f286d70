import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { eq } from 'drizzle-orm';
import { files } from '@/db/schema/files';
import type { Actor } from '@/lib/access/actor';
import { recogniseType } from '@/lib/files/recognise-type';
import { startFakeStorage, type FakeStorage } from '@/server/files/storage/fake-storage';
import { readLimited } from '@/server/files/storage/read-limited';
import { readFile } from '@/server/operations/files/read-file';
import { storeFile } from '@/server/operations/files/store-file';
import { insertAccount } from '../../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../../database/temporary-postgres';
import { actorOf } from '../../desk/bases';

let open: TemporaryDatabase;
let storage: FakeStorage;
let engineer: Actor;
const folder = mkdtempSync(join(tmpdir(), 'sillwright-files-'));

beforeAll(async () => {
  storage = await startFakeStorage(folder);
  Object.assign(process.env, storage.variables);
  open = await temporaryDatabase();
  engineer = actorOf(await insertAccount(open.db, ['test-engineer']));
});
afterAll(async () => {
  await open.close();
  await storage.close();
  rmSync(folder, { recursive: true });
});

const blank = (width: number, height: number) =>
  sharp({ create: { width, height, channels: 3, background: '#27613b' }, limitInputPixels: false });
const bytesOf = async (body: ReadableStream) => Buffer.from(await new Response(body).arrayBuffer());

async function stored(name: string, bytes: Uint8Array, kind: Parameters<typeof storeFile>[1] = 'trimmer-photo') {
  const outcome = await storeFile(engineer, kind, { name, bytes });
  if (!outcome.ok) throw new Error(outcome.sentence);
  const found = await readFile(outcome.value.id);
  return { facts: outcome.value, bytes: await bytesOf(found!.body), file: found!.file };
}
const sentence = async (
  name: string,
  bytes: Uint8Array | null,
  kind: Parameters<typeof storeFile>[1] = 'trimmer-photo',
) => {
  const outcome = await storeFile(engineer, kind, { name, bytes });
  return outcome.ok ? 'stored' : outcome.sentence;
};

describe('storing a picture', () => {
  test('turns it upright, drops what the camera wrote about it and keeps it as WebP', async () => {
    const photo = await blank(60, 40)
      .withExif({ IFD0: { Copyright: 'of the camera' } })
      .withMetadata({ orientation: 6 })
      .jpeg()
      .toBuffer();
    const { facts, bytes } = await stored('front.jpg', photo);
    expect(facts).toMatchObject({ mediaType: 'image/webp', width: 40, height: 60, name: 'front.jpg' });
    const kept = await sharp(bytes).metadata();
    expect(kept).toMatchObject({ format: 'webp', width: 40, height: 60 });
    expect(kept.exif).toBeUndefined();
  });

  test('makes the longer side 2,400 pixels at most', async () => {
    const { facts } = await stored('wide.png', await blank(3_600, 300).png().toBuffer());
    expect(facts).toMatchObject({ width: 2_400, height: 200 });
  });

  test('goes by the content: a PNG named .jpg is a picture, a text named .png is none', async () => {
    const { facts } = await stored('mislabelled.jpg', await blank(20, 20).png().toBuffer());
    expect(facts.mediaType).toBe('image/webp');
    expect(await sentence('notes.png', Buffer.from('only words'))).toBe(
      'notes.png is none of the kinds that fit here. Use JPEG, PNG or WebP, at most 8 MB.',
    );
  });

  test('refuses another type with its name and what may be used', async () => {
    const gif = await blank(8, 8).gif().toBuffer();
    expect(await sentence('trimmer.gif', gif)).toBe('trimmer.gif is a GIF. Use JPEG, PNG or WebP, at most 8 MB.');
    expect(await sentence('plan.pdf', Buffer.from('%PDF-1.4\n%%EOF'))).toMatch(/^plan.pdf is a PDF\. Use JPEG/);
    expect(await sentence('board.svg', Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>'))).toMatch(/is an SVG/);
  });

  test('refuses a file that is too large, empty, cut short or unpacks to too many pixels', async () => {
    expect(await sentence('big.jpg', null)).toBe('big.jpg is too large. Use JPEG, PNG or WebP, at most 8 MB.');
    expect(await sentence('big.jpg', new Uint8Array(8_000_001))).toMatch(/too large/);
    expect(await sentence('none.png', new Uint8Array())).toMatch(/^none.png is empty/);
    const whole = await blank(400, 400).jpeg().toBuffer();
    expect(await sentence('cut.jpg', whole.subarray(0, whole.length / 3))).toMatch(/^cut.jpg cannot be read as a JPEG/);
    const bomb = await blank(8_000, 7_000).png({ compressionLevel: 9 }).toBuffer();
    expect(bomb.length).toBeLessThan(8_000_000);
    expect(await sentence('bomb.png', bomb)).toMatch(/^bomb.png has too many pixels/);
  });
});

describe('storing a fixture drawing', () => {
  test('keeps a PDF byte for byte, and refuses one that ends early or only says that it is one', async () => {
    const pdf = Buffer.from('%PDF-1.7\n1 0 obj\n<<>>\nendobj\ntrailer\n%%EOF\n');
    const { bytes, file } = await stored('fixture.pdf', pdf, 'fixture-drawing');
    expect(bytes.equals(pdf)).toBe(true);
    expect(file).toMatchObject({ mediaType: 'application/pdf', width: null, height: null });
    expect(await sentence('half.pdf', pdf.subarray(0, 20), 'fixture-drawing')).toMatch(/^half.pdf ends too early/);
    expect(await sentence('fixture.pdf', Buffer.from('no drawing'), 'fixture-drawing')).toBe(
      'fixture.pdf is none of the kinds that fit here. Use PDF, JPEG, PNG or WebP, at most 8 MB.',
    );
  });
});

test('a stored file cannot be changed in the database', async () => {
  const { facts } = await stored('once.png', await blank(10, 10).png().toBuffer());
  await expect(
    open.db.update(files).set({ mediaType: 'text/html' }).where(eq(files.id, facts.id)),
  ).rejects.toMatchObject({ cause: { code: 'SW002' } });
});

test('a file that is not there is null', async () => {
  expect(await readFile('00000000-0000-4000-8000-000000000000')).toBeNull();
});

test('reading a body stops at the limit without waiting for the rest', async () => {
  let pulled = 0;
  const endless = new ReadableStream<Uint8Array>({
    pull(controller) {
      pulled += 1;
      controller.enqueue(new Uint8Array(1_000));
    },
  });
  expect(await readLimited(endless, 5_000)).toBeNull();
  expect(pulled).toBeLessThan(12);
  expect(await readLimited(new Response('12345').body, 5)).toHaveLength(5);
});

test.each([
  [[0xff, 0xd8, 0xff, 0xe0], 'JPEG'],
  [[0x52, 0x49, 0x46, 0x46, 0, 0, 0, 0, 0x57, 0x41, 0x56, 0x45], null],
  [[0x49, 0x49, 0x2a, 0x00], 'TIFF'],
  [[], null],
])('bytes %j are recognised as %s', (bytes, type) => {
  expect(recogniseType(Uint8Array.from(bytes))).toBe(type);
});

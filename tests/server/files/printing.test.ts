import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { PDFiumLibrary } from '@hyzyla/pdfium';
import sharp from 'sharp';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { layoutLabel } from '@/lib/barcode/label-layout';
import { startFakePrinter, type FakePrinter } from '@/server/files/fake-printer/fake-printer';
import { askJob, askPrinter, sendDocument } from '@/server/files/printing/ipp-client';
import { labelPdf } from '@/server/files/printing/label-pdf';
import { readCode128 } from '../../lib/barcode/read-barcode';

const serial = 'CB1210264800042';
const timeoutMs = 5_000;

async function pdf(): Promise<Buffer> {
  const outcome = layoutLabel({
    serial,
    serialGroups: ['CB1210', '2648', '00042'],
    boardTypeCode: 'CB1210',
    boardTypeName: '12 V 10 A',
    tripVolts: 10.81,
    releaseVolts: 12.23,
  });
  if (!outcome.ok) throw new Error(outcome.sentence);
  return labelPdf(outcome.layout, serial);
}

let folder: string;
let printer: FakePrinter;
beforeEach(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'label-printer-'));
  printer = await startFakePrinter({ folder, port: 0 });
});
afterEach(async () => {
  await printer.close();
  rmSync(folder, { recursive: true });
});
const kept = () => readdirSync(folder).filter((file) => file.endsWith('.pdf'));

describe('printing a label', () => {
  it('delivers a page of 40 × 20 mm whose barcode an independent decoder reads', async () => {
    const sent = await sendDocument(printer.uri, { jobName: `Label ${serial}`, pdf: await pdf() }, timeoutMs);
    expect(sent).toEqual({ ok: true, jobId: 1 });
    expect(await askJob(printer.uri, 1, timeoutMs)).toEqual({ ok: true, state: 'done' });
    expect(kept()).toEqual([`00001-Label_${serial}.pdf`]);

    const library = await PDFiumLibrary.init();
    const document = await library.loadDocument(readFileSync(path.join(folder, kept()[0]!)));
    expect(document.getPageCount()).toBe(1);
    const page = document.getPage(0);
    const { originalWidth, originalHeight } = page.getOriginalSize();
    expect((originalWidth / 72) * 25.4).toBeCloseTo(40, 1);
    expect((originalHeight / 72) * 25.4).toBeCloseTo(20, 1);
    // 300 dots an inch, as a label printer.
    const picture = await page.render({ scale: 300 / 72, render: 'bitmap' });
    const raw = { width: picture.width, height: picture.height, channels: 4 as const };
    expect(await readCode128(sharp(picture.data, { raw }))).toEqual([serial]);
    library.destroy();
  });

  it('says that paper is out, and the job that was taken prints when it is loaded', async () => {
    printer.setPaper(false);
    expect(await askPrinter(printer.uri, timeoutMs)).toMatchObject({ ok: false, code: 'printer-out-of-paper' });
    expect(await sendDocument(printer.uri, { jobName: 'a', pdf: await pdf() }, timeoutMs)).toMatchObject({ ok: true });
    expect(await askJob(printer.uri, 1, timeoutMs)).toMatchObject({ ok: false, code: 'printer-out-of-paper' });
    expect(kept()).toEqual([]);
    printer.setPaper(true);
    expect(await askPrinter(printer.uri, timeoutMs)).toEqual({ ok: true });
    expect(await askJob(printer.uri, 1, timeoutMs)).toEqual({ ok: true, state: 'done' });
    expect(kept()).toHaveLength(1);
  });

  it('is refused when the document is not a PDF', async () => {
    const sent = await sendDocument(printer.uri, { jobName: 'a', pdf: Buffer.from('hello') }, timeoutMs);
    expect(sent).toMatchObject({ ok: false, code: 'printer-refused', sentence: expect.stringContaining('0x040a') });
  });

  it('says when nobody answers', async () => {
    await printer.close();
    expect(await askPrinter(printer.uri, timeoutMs)).toMatchObject({ ok: false, code: 'printer-unreachable' });
    printer = await startFakePrinter({ folder, port: 0 });
  });

  it('says so of a printer that takes the connection and stays silent', async () => {
    const silent = http.createServer(() => undefined).listen(0, '127.0.0.1');
    await new Promise((resolve) => silent.once('listening', resolve));
    const uri = `ipp://127.0.0.1:${(silent.address() as AddressInfo).port}/`;
    expect(await askPrinter(uri, 100)).toMatchObject({ ok: false, code: 'printer-unreachable' });
    silent.closeAllConnections();
    silent.close();
  });

  it.each([['http://127.0.0.1:1/x'], ['printer'], ['ftp://printer/x']])(
    'returns a refusal for the address %s',
    async (uri) => {
      expect(await askPrinter(uri, 500)).toMatchObject({ ok: false });
    },
  );
});

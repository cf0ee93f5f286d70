import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';
import type { Sharp } from 'sharp';
import { prepareZXingModule, readBarcodes } from 'zxing-wasm/reader';

// The decoder comes with its machine code in the package; without this it would look for it on the network.
const wasm = path.join(
  path.dirname(createRequire(import.meta.url).resolve('zxing-wasm/reader')),
  '../../reader/zxing_reader.wasm',
);
prepareZXingModule({ overrides: { wasmBinary: new Uint8Array(readFileSync(wasm)).buffer } });

/** Texts of all Code 128 barcodes in a picture (PNG, SVG or raw pixels), as an independent decoder (ZXing) reads them. */
export function readCode128(picture: Sharp): Promise<string[]> {
  return read(picture, 'Code128');
}

/** The same for QR codes. */
export function readQrCodes(picture: Sharp): Promise<string[]> {
  return read(picture, 'QRCode');
}

async function read(picture: Sharp, format: 'Code128' | 'QRCode'): Promise<string[]> {
  const { data, info } = await picture
    .flatten({ background: '#fff' })
    .ensureAlpha()
    .raw()
    .toBuffer({ resolveWithObject: true });
  const pixels = {
    data: new Uint8ClampedArray(data),
    width: info.width,
    height: info.height,
    colorSpace: 'srgb' as const,
  };
  const found = await readBarcodes(pixels as ImageData, { formats: [format], tryHarder: true });
  return found.filter((barcode) => barcode.isValid).map((barcode) => barcode.text);
}

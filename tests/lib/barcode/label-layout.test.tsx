import { renderToStaticMarkup } from 'react-dom/server';
import sharp from 'sharp';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { LabelDrawing } from '@/components/desk/label-drawing';
import { encodeCode128, widthInModules } from '@/lib/barcode/code128';
import { layoutLabel, type LabelContent } from '@/lib/barcode/label-layout';
import { serialGroups } from '@/lib/barcode/serial-groups';
import { readCode128 } from './read-barcode';

const content = (serial: string): LabelContent => ({
  serial,
  serialGroups: serialGroups(serial, 'CB1210'),
  boardTypeCode: 'CB1210',
  boardTypeName: '12 V 10 A',
  tripVolts: 10.8123,
  releaseVolts: 12.2261,
});

function layoutOf(serial: string) {
  const outcome = layoutLabel(content(serial));
  if (!outcome.ok) throw new Error(outcome.sentence);
  return outcome.layout;
}

const svgOf = (serial: string) => renderToStaticMarkup(<LabelDrawing layout={layoutOf(serial)} serial={serial} />);

describe('a label', () => {
  it('is 165 modules of 0.2 mm wide for a serial of two letters and thirteen digits', () => {
    expect(widthInModules(encodeCode128('CB1210264800042')!)).toBe(165);
    expect(layoutOf('CB1210264800042').barcode.moduleMm).toBe(0.2);
  });

  it.each([300, 600])('drawn at %i dots an inch is read by an independent decoder', async (dotsPerInch) => {
    // 38 mm of the drawing, at the density of a label printer.
    const width = Math.round((38 / 25.4) * dotsPerInch);
    const picture = sharp(Buffer.from(svgOf('CB1210264800042')), { density: 300 }).resize({ width });
    expect(await readCode128(picture)).toEqual(['CB1210264800042']);
  });

  it('carries any serial of the shop floor', async () => {
    const serials = fc
      .tuple(fc.constantFrom('CB', 'X', 'UVC-', 'A/'), fc.stringMatching(/^\d{4,14}$/))
      .map((parts) => parts.join(''));
    await fc.assert(
      fc.asyncProperty(serials, async (serial) => {
        // Whole dots a module: between them the decoder also reads ghosts beside the serial.
        const picture = sharp(Buffer.from(svgOf(serial)), { density: 600 }).resize({ width: 6 * (38 / 0.2) });
        expect(await readCode128(picture)).toEqual([serial]);
      }),
      { numRuns: 25 },
    );
  });

  it('says the type, both measured points and the serial in groups', () => {
    expect(layoutOf('CB1210264800042').texts.map((line) => line.text)).toEqual([
      'CB1210, 12 V 10 A',
      'off 10.81 V, on 12.23 V',
      'CB1210 2648 00042',
    ]);
  });

  it('leaves out the lines that its board type does not want; barcode and serial stay', () => {
    const textsOf = (lines: LabelContent['lines']) => {
      const outcome = layoutLabel({ ...content('CB1210264800042'), lines });
      return outcome.ok ? outcome.layout.texts.map(({ text }) => text) : [];
    };
    expect(textsOf({ typeLine: false, pointsLine: true })).toEqual(['off 10.81 V, on 12.23 V', 'CB1210 2648 00042']);
    expect(textsOf({ typeLine: true, pointsLine: false })).toEqual(['CB1210, 12 V 10 A', 'CB1210 2648 00042']);
    expect(textsOf({ typeLine: false, pointsLine: false })).toEqual(['CB1210 2648 00042']);
  });

  it('is refused for a serial whose bars would be too fine to read', () => {
    expect(layoutLabel(content('ABCDEFGHIJKLMNOPQRSTUVWXYZ'))).toMatchObject({
      ok: false,
      code: 'serial-not-printable',
    });
  });

  it('is refused for characters that no barcode carries', () => {
    expect(layoutLabel(content('CBÜ100001'))).toMatchObject({ ok: false, code: 'serial-not-printable' });
  });
});

describe('groups of a serial', () => {
  it('loses no character', () => {
    fc.assert(fc.property(fc.string(), (serial) => serialGroups(serial, 'CB1210').join('') === serial));
  });

  it('keeps the last five together', () => {
    expect(serialGroups('CB1210264800042', 'CB1210')).toEqual(['CB1210', '2648', '00042']);
    expect(serialGroups('42', 'CB1210')).toEqual(['42']);
  });
});

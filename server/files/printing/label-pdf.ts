import path from 'node:path';
import PDFDocument from 'pdfkit';
import type { LabelLayout } from '@/lib/barcode/label-layout';

const pointsPerMm = 72 / 25.4;
// The variable cuts do not embed in a PDF; these are the static ones of the same faces.
const fontFile = (face: string, weight: number) =>
  path.join(process.cwd(), `node_modules/@fontsource/${face}/files/${face}-latin-${weight}-normal.woff`);
const fonts = {
  text: fontFile('atkinson-hyperlegible-next', 400),
  'num-bold': fontFile('atkinson-hyperlegible-mono', 700),
};

/** One page of the label's own size, vector throughout. */
export async function labelPdf(layout: LabelLayout, title: string): Promise<Buffer> {
  const page = new PDFDocument({
    size: [layout.widthMm * pointsPerMm, layout.heightMm * pointsPerMm],
    margin: 0,
    info: { Title: title, Creator: 'Sillwright' },
  });
  const chunks: Buffer[] = [];
  page.on('data', (chunk: Buffer) => chunks.push(chunk));
  const ended = new Promise<void>((resolve, reject) => page.once('end', resolve).once('error', reject));

  page.save().scale(pointsPerMm);
  page.path(layout.barcode.path).fill('#000');
  page.path(layout.mark.path).lineWidth(layout.mark.strokeMm).stroke('#000');
  page.restore();
  for (const line of layout.texts) {
    page.font(fonts[line.font]).fontSize(line.sizePt).fillColor('#000');
    const shift = line.anchor === 'middle' ? page.widthOfString(line.text) / 2 : 0;
    page.text(line.text, line.xMm * pointsPerMm - shift, line.yMm * pointsPerMm, {
      lineBreak: false,
      baseline: 'alphabetic',
    });
  }
  page.end();
  await ended;
  return Buffer.concat(chunks);
}

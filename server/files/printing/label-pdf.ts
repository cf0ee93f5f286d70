import PDFDocument from 'pdfkit';
import type { LabelLayout } from '@/lib/barcode/label-layout';
import { faces } from '../pdf/faces';

const pointsPerMm = 72 / 25.4;

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
    page.font(faces[line.font]).fontSize(line.sizePt).fillColor('#000');
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

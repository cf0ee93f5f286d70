import QRCode from 'qrcode';
import { barPath } from '@/lib/barcode/bar-path';
import { encodeCode128, widthInModules } from '@/lib/barcode/code128';
import { cautionSentences, clockWords, dayWords } from '@/lib/certificate/certificate-words';
import { inks, paper as a4, type Paper } from './paper';
import type { PrintedCertificate } from './certificate-pdf';

export const ruleUnderHead = 88;

/** Mark and number over every page. */
export function drawHead(paper: Paper, number: string, page: number, of: number): void {
  const { pdf } = paper;
  pdf
    .save()
    .translate(a4.left, a4.top)
    .scale(25 / 48);
  pdf.path('M2 40H33V15M46 8H15V33').lineWidth(6).stroke(inks.ink);
  pdf.restore();
  paper.line('Sillwright', a4.left + 36, a4.top + 15, { face: 'bold', size: 15 });
  paper.line(`Certificate ${number}, page ${page} of ${of}`, a4.right, a4.top + 13, {
    size: 10,
    ink: 'ink2',
    anchor: 'end',
  });
  paper.rule(a4.left, a4.right, ruleUnderHead, 3.5);
}

/** Where what a first page says must end: below stand cautions, signatures and codes. */
export const footFrom = 652;

export function drawFoot(paper: Paper, certificate: PrintedCertificate, coded: string): void {
  const { content, issuedByName, issuedIso, seal, verifyUrl, timeZone } = certificate;
  paper.element('P', () => {
    paper.rule(a4.left, a4.right, footFrom + 6, 0.75, 'hair');
    cautionSentences.forEach((sentence, i) => paper.line(sentence, a4.left, footFrom + 20 + i * 12.5, { ink: 'ink2' }));
  });
  const operator = content.kind === 'board' ? content.boards[0]!.operatorNumber : null;
  const issued = `${dayWords(issuedIso, timeZone)}, ${clockWords(issuedIso, timeZone)}`;
  paper.element('P', () => {
    const y = 716;
    if (operator) paper.line(`Tested by operator ${operator}`, a4.left, y, { size: 10 });
    paper.line(`Issued by ${issuedByName}, quality`, a4.left, y + 17, { face: 'bold', size: 10 });
    paper.line(issued, a4.left, y + 30, { size: 10 });
    paper.rule(a4.left, a4.left + 215, y + 37);
    paper.line('Signed with the password at that moment.', a4.left, y + 49, { ink: 'ink2' });
    const width = paper.line('Seal of the signature …', a4.left, y + 61, { ink: 'ink2' });
    paper.line(seal, a4.left + width, y + 61, { face: 'num-bold', size: 9 });
  });
  paper.element('Figure', () => drawCode128(paper, coded, 372, 704), `Code 128 barcode of ${coded}`);
  paper.element(
    'Figure',
    () => drawQr(paper, verifyUrl, a4.right - 82, 698, 82),
    'QR code with the address that says whether this certificate is valid',
  );
  paper.element('P', () => {
    const lines = paper.wrap(`Valid? Scan the square, or open ${verifyUrl}`, a4.right - a4.left, { size: 8 });
    lines.forEach((line, i) => paper.line(line, a4.left, 797 + i * 10, { size: 8, ink: 'ink2' }));
  });
}

/** Its middle at `x`. Bars of 0.25 mm, or narrower where the text is long. */
function drawCode128(paper: Paper, text: string, x: number, y: number): void {
  const code = encodeCode128(text);
  if (!code) return;
  const modules = widthInModules(code);
  const moduleWidth = Math.min(0.72, 150 / modules);
  const box = { x: x - (modules * moduleWidth) / 2, y, module: moduleWidth, height: 36 };
  paper.pdf.path(barPath(code, box)).fill(inks.ink);
  paper.line(text, x, y + 48, { face: 'num', size: 8.5, anchor: 'middle' });
}

function drawQr(paper: Paper, text: string, x: number, y: number, side: number): void {
  const { data, size } = QRCode.create(text, { errorCorrectionLevel: 'M' }).modules;
  const dot = side / size;
  let path = '';
  for (let row = 0; row < size; row++)
    for (let column = 0; column < size; column++) {
      // Runs of dark modules as one rectangle: no seams in print.
      let run = 0;
      while (column + run < size && data[row * size + column + run]) run++;
      if (run > 0) path += `M${x + column * dot} ${y + row * dot}h${run * dot}v${dot}h${-run * dot}z`;
      column += run;
    }
  paper.pdf.path(path).fill(inks.ink);
}

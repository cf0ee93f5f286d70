import { serialGroups } from '@/lib/barcode/serial-groups';
import {
  benchWords,
  boardSentence,
  instrumentWords,
  lotSentence,
  uncertaintySentence,
} from '@/lib/certificate/certificate-words';
import { railsOfBoard } from '@/lib/certificate/rails-of-board';
import { valueText } from '@/lib/certificate/value-text';
import type { CertificateContent, CertifiedValue } from '@/lib/contracts/certificate';
import { Flow } from './flow';
import { drawBoards, widestOf } from './lot-table';
import { drawFoot, drawHead } from './page-parts';
import { Paper, paper as a4 } from './paper';
import { drawRails, type PrintedPoints } from './rails-drawing';
import { drawValues } from './value-table';

export interface PrintedCertificate {
  number: string;
  content: CertificateContent;
  issuedIso: string;
  issuedByName: string;
  /** As much of the signature's digest as is printed. */
  seal: string;
  /** Goes into the QR code. */
  verifyUrl: string;
  timeZone: string;
}

const railsScale = 0.4;
const beside = 296;

/** A certificate on A4 as vectors, with our faces embedded; the same content gives the same bytes. */
export async function certificatePdf(certificate: PrintedCertificate): Promise<Buffer> {
  const { number, content, issuedIso } = certificate;
  const serial = content.kind === 'board' ? content.boards[0]!.serial : null;
  const paper = new Paper({
    title: `Certificate ${number}`,
    subject: serial ? `Board ${serial}` : `Lot ${content.lotCode}`,
    madeAt: new Date(issuedIso),
  });
  const top = drawTop(paper, certificate);
  if (serial) drawBoard(paper, content, top);
  else drawLot(paper, content, top);
  const { pdf } = paper;
  const last = pdf.bufferedPageRange().count - 1;
  pdf.switchToPage(0);
  drawFoot(paper, certificate, serial ?? content.lotCode);
  pdf.switchToPage(last);
  if (!serial) await drawBoards(paper, content);
  const { count } = pdf.bufferedPageRange();
  for (let page = 0; page < count; page++) {
    pdf.switchToPage(page);
    paper.artifact(() => drawHead(paper, number, page + 1, count));
  }
  return paper.finish();
}

/** Title, what it is of, and the sentence; where they end. */
function drawTop(paper: Paper, { content, timeZone }: PrintedCertificate): number {
  const serial = content.kind === 'board' ? content.boards[0]!.serial : null;
  paper.element('H1', () => paper.line('Test certificate', a4.left, 136, { face: 'bold', size: 25 }));
  paper.element('P', () => {
    const groups = serial ? serialGroups(serial, content.boardTypeCode) : ['Lot', content.lotCode];
    let x: number = a4.left;
    groups.forEach((group, i) => {
      const heavy = i === groups.length - 1;
      x += paper.line(group, x, 171, {
        face: heavy ? 'num-bold' : 'num',
        size: heavy ? 25 : 20,
        ink: heavy ? 'ink' : 'ink2',
      });
      x += 11;
    });
    paper.line(content.boardTypeName, a4.right, 171, { size: 10, ink: 'ink2', anchor: 'end' });
  });
  const sentence = serial ? boardSentence(content, timeZone) : lotSentence(content);
  const lines = paper.wrap(sentence, a4.right - a4.left, { size: 12.5 });
  paper.element('P', () => lines.forEach((line, i) => paper.line(line, a4.left, 203 + i * 18.3, { size: 12.5 })));
  const end = 203 + (lines.length - 1) * 18.3 + 15;
  paper.rule(a4.left, a4.right, end);
  return end;
}

function drawBoard(paper: Paper, content: CertificateContent, top: number): void {
  const board = content.boards[0]!;
  const rails = railsOfBoard(board);
  // A long story leaves no room beside the rails: the table says all that they draw.
  const drawn = rails !== null && top + 734 * railsScale < 652;
  if (drawn) {
    const alt =
      'Trip and release point against their limits, with the hysteresis between them; the table has the numbers';
    paper.element('Figure', () => drawRails(paper, rails, pointsOf(board.values), 29, top + 2, railsScale), alt);
  }
  const flow = new Flow(paper, drawn ? beside : a4.left, top + 8);
  drawValues(flow, board.values);
  notes(flow, content);
}

function pointsOf(values: readonly CertifiedValue[]): PrintedPoints {
  const of = (quantity: CertifiedValue['quantity']) => valueText(values.find((value) => value.quantity === quantity)!);
  const limits = (quantity: CertifiedValue['quantity']) => {
    const [min, max] = of(quantity).limits.split('–');
    return { min: min!, max: max! };
  };
  const spread = values.some(({ quantity }) => quantity === 'hysteresis-volts');
  return {
    trip: of('trip-volts').value,
    release: of('release-volts').value,
    hysteresis: spread ? of('hysteresis-volts').value : '',
    limits: { trip: limits('trip-volts'), release: limits('release-volts') },
  };
}

function drawLot(paper: Paper, content: CertificateContent, top: number): void {
  const flow = new Flow(paper, a4.left, top + 12);
  for (const quantity of ['trip-volts', 'release-volts', 'hysteresis-volts'] as const) {
    const widest = widestOf(content.boards, quantity);
    if (!widest) continue;
    const { name, limits, expanded, k } = valueText(widest);
    const u = expanded ? ` U is at most ${expanded}, with k = ${k}.` : '';
    flow.paragraph(`${name}: limits ${limits}.${u}`, { size: 10, after: 2 });
  }
  flow.y += 6;
  notes(flow, content);
}

function notes(flow: Flow, content: CertificateContent): void {
  const note = { size: 9, ink: 'ink2', after: 6 } as const;
  flow.paragraph(uncertaintySentence, note);
  for (const { sequenceRevision, decisionRule } of content.procedures) {
    const which = content.procedures.length > 1 ? `Sequence revision ${sequenceRevision}: ` : '';
    flow.paragraph(which + decisionRule, note);
  }
  for (const bench of content.benches)
    flow.paragraph([benchWords(bench), ...bench.instruments.map(instrumentWords)].join(' '), note);
  for (const { serial, concession } of content.boards) {
    if (!concession) continue;
    const names = concession.signatures.map(({ name, atIso }) => `${name} (${atIso.slice(0, 10)})`).join(' and ');
    const which = content.kind === 'lot' ? `Board ${serial}: ` : '';
    flow.paragraph(`${which}concession signed by ${names}. Reason: ${concession.reason.replace(/\.$/, '')}.`, note);
  }
  flow.paragraph(
    content.kind === 'lot'
      ? `Sequence ${content.sequenceName} ${content.procedures.map(({ sequenceRevision }) => sequenceRevision).join(', ')}. The record holds every reading.`
      : 'The record holds every reading.',
    note,
  );
}

import { valueText } from '@/lib/certificate/value-text';
import type { CertificateContent, CertifiedBoard, CertifiedValue } from '@/lib/contracts/certificate';
import { ruleUnderHead } from './page-parts';
import { paper as a4, type Paper } from './paper';

const points = [
  { quantity: 'trip-volts', end: 250 },
  { quantity: 'release-volts', end: 318 },
  { quantity: 'hysteresis-volts', end: 386 },
] as const;
const step = 13.6;
const small = { size: 8 } as const;
const number = { face: 'num', size: 8, anchor: 'end' } as const;

/** U of a quantity, the largest of all boards. Null: none is stated. */
export function widestOf(
  boards: readonly CertifiedBoard[],
  quantity: CertifiedValue['quantity'],
): CertifiedValue | null {
  return boards
    .flatMap(({ values }) => values.filter((value) => value.quantity === quantity))
    .reduce<CertifiedValue | null>(
      (widest, value) =>
        (value.expandedUncertainty ?? 0) > (widest?.expandedUncertainty ?? 0) ? value : (widest ?? value),
      null,
    );
}

function head(paper: Paper, { boards }: CertificateContent, y: number): void {
  paper.line('Serial', a4.left, y, small);
  paper.line('Attempt', 188, y, { ...small, anchor: 'end' });
  for (const { quantity, end } of points) {
    const value = widestOf(boards, quantity);
    if (!value) continue;
    const { name, limits } = valueText(value);
    paper.line(name.replace(' point', ''), end, y, { ...small, anchor: 'end' });
    paper.line(limits, end, y + 11, { ...number, size: 7.5 });
  }
  paper.line('Station', 402, y, small);
  paper.line('Tested, UTC', a4.right, y, { ...small, anchor: 'end' });
  paper.rule(a4.left, a4.right, y + 16);
}

function row(paper: Paper, content: CertificateContent, board: CertifiedBoard, y: number): void {
  paper.line(board.serial, a4.left, y, { face: 'num-bold', size: 8 });
  paper.line(String(board.attempt), 188, y, number);
  for (const { quantity, end } of points) {
    const value = board.values.find((each) => each.quantity === quantity);
    if (value)
      paper.line(valueText(value).value, end, y, value.passed === false ? { ...number, face: 'num-bold' } : number);
  }
  const { stationCode } = content.benches[board.bench]!;
  paper.line(board.concession ? `${stationCode}, by concession` : stationCode, 402, y, small);
  paper.line(board.testedAtIso.slice(0, 16).replace('T', ' '), a4.right, y, number);
  paper.rule(a4.left, a4.right, y + 4.2, 0.5, 'hair');
}

const breathe = () => new Promise<void>((resolve) => setImmediate(resolve));

/** Every board of the lot, on pages of its own. Other work runs between pages: a large lot takes seconds. */
export async function drawBoards(paper: Paper, content: CertificateContent): Promise<void> {
  const first = ruleUnderHead + 56;
  const onPage = Math.floor((a4.bottom - first) / step);
  for (let from = 0; from < content.boards.length; from += onPage) {
    await breathe();
    paper.pdf.addPage();
    paper.element('P', () => head(paper, content, ruleUnderHead + 24));
    paper.element('P', () => {
      content.boards.slice(from, from + onPage).forEach((board, i) => row(paper, content, board, first + i * step));
    });
  }
}

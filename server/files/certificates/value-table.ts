import { valueText } from '@/lib/certificate/value-text';
import type { CertifiedValue } from '@/lib/contracts/certificate';
import type { Flow } from './flow';
import { inks, paper as a4, type Paper } from './paper';

/** Right edges of the columns of numbers. */
const ends = { limits: 434, value: 480, expanded: 518, k: a4.right };
const line = 11;

function head({ paper, left, y }: Flow): void {
  const of = { size: 8.5, ink: 'ink2', anchor: 'end' } as const;
  paper.line('Limits', ends.limits, y + 10, of);
  paper.line('Measured', ends.value, y + 10, of);
  paper.line('U', ends.expanded, y + 10, of);
  paper.line('k', ends.k, y + 10, of);
  paper.rule(left, a4.right, y + 17, 0.75, 'rule');
}

function side(paper: Paper, { quantity }: CertifiedValue, x: number, y: number): number {
  if (quantity !== 'trip-volts' && quantity !== 'release-volts') return 0;
  const down = quantity === 'trip-volts';
  paper.pdf.path(down ? `M${x} ${y - 6.5}h8l-4 6.5z` : `M${x} ${y}h8l-4-6.5z`).fill(inks[down ? 'trip' : 'release']);
  return 11;
}

/** Limits, results, U and k; a result outside its limits says so in words. */
export function drawValues(flow: Flow, values: readonly CertifiedValue[]): void {
  const { paper } = flow;
  flow.room(40);
  paper.element('P', () => head(flow));
  flow.y += 18;
  for (const value of values) {
    const { name, limits, value: measured, expanded, k } = valueText(value);
    const indent = value.quantity === 'trip-volts' || value.quantity === 'release-volts' ? 11 : 0;
    const widest = ends.limits - paper.widthOf(limits, { face: 'num', size: 8.5 }) - 4 - flow.left - indent;
    const names = paper.wrap(name, widest, { size: 8.5 });
    if (value.passed === false) names.push('outside its limits');
    const height = names.length * line + 9;
    if (flow.room(height)) {
      head(flow);
      flow.y += 18;
    }
    const y = flow.y + 13;
    paper.element('P', () => {
      side(paper, value, flow.left, y);
      names.forEach((words, i) => {
        const outside = value.passed === false && i === names.length - 1;
        paper.line(words, flow.left + indent, y + i * line, { size: 8.5, face: outside ? 'bold' : 'text' });
      });
      paper.line(limits, ends.limits, y, { face: 'num', size: 8.5, anchor: 'end' });
      paper.line(measured, ends.value, y, { face: 'num-bold', size: 8.5, anchor: 'end' });
      paper.line(expanded, ends.expanded, y, { face: 'num', size: 8.5, anchor: 'end' });
      paper.line(k, ends.k, y, { face: 'num', size: 8.5, anchor: 'end' });
    });
    flow.y += height;
    paper.rule(flow.left, a4.right, flow.y, 0.75, 'hair');
  }
  flow.y += 12;
}

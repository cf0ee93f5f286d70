import type { FigureRow } from './figure';

const text = (value: string | number | null) => (value === null ? '' : String(value));

/** A plain table: words to the left, numbers to the right. */
export function formatTable(rows: FigureRow[]): string {
  const columns = [...new Set(rows.flatMap((row) => Object.keys(row)))];
  const cells = rows.map((row) => columns.map((column) => text(row[column] ?? null)));
  const isNumber = columns.map((column) => rows.every((row) => typeof row[column] !== 'string'));
  const widths = columns.map((column, i) => Math.max(column.length, ...cells.map((line) => line[i]!.length)));
  const pad = (value: string, i: number) => (isNumber[i] ? value.padStart(widths[i]!) : value.padEnd(widths[i]!));
  const lines = [columns, ...cells].map((line) => line.map(pad).join('  ').trimEnd());
  lines.splice(1, 0, widths.map((width) => '-'.repeat(width)).join('  '));
  return lines.join('\n');
}

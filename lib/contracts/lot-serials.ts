import { parse } from 'csv-parse/sync';
import { fitsOnLabel } from '../barcode/label-layout';
import { readScan } from '../bench/scan-code';

/** Boards of one lot. */
export const mostBoards = 5_000;

export interface SerialRow {
  /** Line of the file, or place in the list, from 1. */
  line: number;
  serial: string;
  /** What is wrong and what to do; null when the row can be stored. */
  problem: string | null;
}

export type SerialList = { ok: true; rows: { line: number; serial: string }[] } | { ok: false; sentence: string };

const heading = /^(serial|serials|serial[ _-]?(number|no\.?)|sn)$/i;

/** A scanner reads capitals only, so serials are kept that way. */
const tidy = (cell: string) => cell.trim().toUpperCase();

function delimiterOf(text: string): string {
  const line = text.split(/\r?\n/, 1)[0] ?? '';
  return [';', '\t', ','].find((mark) => line.includes(mark)) ?? ',';
}

/**
 * The serial numbers of an uploaded file: one column, or a column headed “serial”. Comma, semicolon or tab between
 * columns; empty lines are left out.
 */
export function readSerialFile(text: string): SerialList {
  let records: { record: string[]; info: { lines: number } }[];
  try {
    records = parse(text, {
      bom: true,
      delimiter: delimiterOf(text.replace(/^\ufeff/, '')),
      info: true,
      relax_column_count: true,
      skip_empty_lines: true,
      skip_records_with_empty_values: true,
      // With `info` each record comes with its line, which the types of the package do not say.
    }) as unknown as typeof records;
  } catch (error) {
    return {
      ok: false,
      sentence: `The file is not a readable CSV: ${error instanceof Error ? error.message : 'unknown'}.`,
    };
  }
  const first = records[0]?.record;
  if (!first) return { ok: false, sentence: 'The file is empty. Choose one with a serial number on each line.' };
  const headed = first.findIndex((cell) => heading.test(cell.trim()));
  if (headed < 0 && records.some(({ record }) => record.length > 1))
    return { ok: false, sentence: 'The file has several columns. Name the one with the serial numbers “serial”.' };
  const rows = records.slice(headed < 0 ? 0 : 1).map(({ record, info }) => ({
    line: info.lines,
    serial: tidy(record[Math.max(headed, 0)] ?? ''),
  }));
  if (rows.length === 0) return { ok: false, sentence: 'The file has a heading and no serial number below it.' };
  if (rows.length > mostBoards)
    return { ok: false, sentence: `The file has ${rows.length} serial numbers. A lot takes at most ${mostBoards}.` };
  return { ok: true, rows };
}

/** `quantity` serials from the first one up, its last digits counted on; the width stays. */
export function countUpSerials(firstSerial: string, quantity: number): SerialList {
  const first = tidy(firstSerial);
  const digits = /\d+$/.exec(first)?.[0];
  if (!digits)
    return { ok: false, sentence: 'End the first serial number with digits, so that the next ones can be counted.' };
  const lead = first.slice(0, first.length - digits.length);
  const start = BigInt(digits);
  const rows = Array.from({ length: quantity }, (_, i) => ({
    line: i + 1,
    serial: lead + String(start + BigInt(i)).padStart(digits.length, '0'),
  }));
  if (rows.some((row) => row.serial.length !== first.length))
    return { ok: false, sentence: `${first} cannot be counted up ${quantity} times in ${digits.length} digits.` };
  return { ok: true, rows };
}

/**
 * Each row with what is wrong with it. `pattern` is the board type's serial pattern, `lotOf` the lot that already has a
 * serial, if any.
 */
export function checkSerials(
  rows: readonly { line: number; serial: string }[],
  { pattern, boardTypeCode, lotOf }: { pattern: string; boardTypeCode: string; lotOf: ReadonlyMap<string, string> },
): SerialRow[] {
  const matches = new RegExp(pattern);
  const lineOf = new Map<string, number>();
  return rows.map(({ line, serial }) => {
    const problem = (() => {
      if (serial === '') return 'No serial number on this line.';
      if (readScan(serial).kind !== 'serial')
        return `${serial.slice(0, 4)} begins our own barcodes for badges, lots and bins. Use another serial number.`;
      if (!matches.test(serial)) return `Not a serial number of ${boardTypeCode}.`;
      if (!fitsOnLabel(serial)) return 'Too long, or with letters that a barcode cannot carry.';
      const seen = lineOf.get(serial);
      if (seen !== undefined) return `The same as on line ${seen}.`;
      const lot = lotOf.get(serial);
      return lot === undefined ? null : `Already in lot ${lot}.`;
    })();
    if (!lineOf.has(serial)) lineOf.set(serial, line);
    return { line, serial, problem };
  });
}

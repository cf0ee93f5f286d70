import { barPath } from './bar-path';
import { encodeCode128, widthInModules } from './code128';

/** What a label says of a board that passed. Measured points, volts. */
export interface LabelContent {
  serial: string;
  /** The serial as people read it, in groups. */
  serialGroups: string[];
  boardTypeCode: string;
  boardTypeName: string;
  tripVolts: number | null;
  releaseVolts: number | null;
  /** Which lines the board type wants beside barcode and serial. Absent: both. */
  lines?: { typeLine: boolean; pointsLine: boolean };
}

export interface LabelText {
  /** Baseline, millimetres from the upper left corner. */
  xMm: number;
  yMm: number;
  sizePt: number;
  anchor: 'start' | 'middle';
  font: 'text' | 'num-bold';
  text: string;
}

/** A label of 40 × 20 mm, all lengths in millimetres. Bars of 0.2 mm need a printer of 300 dots an inch or finer. */
export interface LabelLayout {
  widthMm: number;
  heightMm: number;
  texts: LabelText[];
  barcode: { path: string; moduleMm: number };
  /** Our mark, stroked. */
  mark: { path: string; strokeMm: number };
}

export type LabelOutcome =
  { ok: true; layout: LabelLayout } | { ok: false; code: 'serial-not-printable'; sentence: string };

const widthMm = 40;
const heightMm = 20;
const marginMm = 1;
const wantedModuleMm = 0.2;
/** Common practice: most scanners of the shop floor read bars down to 7.5 mils. */
const leastModuleMm = 0.19;

const shortened = (text: string, most: number) => (text.length <= most ? text : `${text.slice(0, most - 1)}…`);

function pointsText({ tripVolts, releaseVolts }: LabelContent): string {
  const parts = [];
  if (tripVolts !== null) parts.push(`off ${tripVolts.toFixed(2)} V`);
  if (releaseVolts !== null) parts.push(`on ${releaseVolts.toFixed(2)} V`);
  return parts.join(', ');
}

/** Width of one module so that the whole barcode lies inside the label, or null where it could not be read. */
function moduleMmFor(serial: string): number | null {
  const code = encodeCode128(serial);
  if (!code) return null;
  const moduleMm = Math.min(wantedModuleMm, (widthMm - 2 * marginMm) / widthInModules(code));
  return moduleMm < leastModuleMm ? null : moduleMm;
}

/** Whether a label of 40 × 20 mm can carry the serial as a barcode. */
export function fitsOnLabel(serial: string): boolean {
  return moduleMmFor(serial) !== null;
}

/** Refused when the serial has characters a barcode cannot carry, or is too long for bars that a scanner can read. */
export function layoutLabel(content: LabelContent): LabelOutcome {
  const code = encodeCode128(content.serial);
  const moduleMm = moduleMmFor(content.serial);
  if (!code || moduleMm === null)
    return {
      ok: false,
      code: 'serial-not-printable',
      sentence: `Serial ${content.serial} does not fit on a label of 40 × 20 mm. Use a shorter serial for the next lot.`,
    };
  const barWidthMm = widthInModules(code) * moduleMm;
  const { typeLine, pointsLine } = content.lines ?? { typeLine: true, pointsLine: true };
  return {
    ok: true,
    layout: {
      widthMm,
      heightMm,
      texts: [
        {
          xMm: 2.3,
          yMm: 3.5,
          sizePt: 5,
          anchor: 'start',
          font: 'text',
          text: typeLine ? shortened(`${content.boardTypeCode}, ${content.boardTypeName}`, 38) : '',
        },
        { xMm: 2.3, yMm: 5.9, sizePt: 5, anchor: 'start', font: 'text', text: pointsLine ? pointsText(content) : '' },
        {
          xMm: widthMm / 2,
          yMm: 18,
          sizePt: 7,
          anchor: 'middle',
          font: 'num-bold',
          text: content.serialGroups.join(' '),
        },
      ].filter((line) => line.text !== '') as LabelText[],
      barcode: {
        path: barPath(code, { x: (widthMm - barWidthMm) / 2, y: 7.7, module: moduleMm, height: 7 }),
        moduleMm,
      },
      mark: { path: 'M34.44 4.83H36.64V3.06M37.56 2.57H35.36V4.34', strokeMm: 0.42 },
    },
  };
}

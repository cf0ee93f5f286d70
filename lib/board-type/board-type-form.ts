import { boardTypeSchema, tolerancesOf, type BoardType } from '../contracts/board-type';
import {
  absoluteMaximumField,
  degreesATurn,
  drawnParts,
  limitRows,
  mostAttemptsField,
  searchRows,
  thresholdAmpsField,
  thresholdVoltsField,
  travelFields,
  undrawnParts,
  type NumberField,
} from './fields';
import { degreesStyle } from './quantity-styles';
import { readQuantity, writeQuantity } from './quantity-text';

/** A board type as it is typed: every number as text, so that nothing typed is lost, and the rest as it is chosen. */
export interface BoardTypeForm {
  /** By the field's path. */
  texts: Record<string, string>;
  name: string;
  serialPattern: string;
  clockwise: BoardType['trimmer']['clockwise'];
  travelUnit: 'turns' | 'degrees';
  sensing: BoardType['sensing']['kind'];
  label: NonNullable<BoardType['label']>;
  trimmerPhoto: BoardType['trimmerPhoto'] | null;
  fixtureDrawing: BoardType['fixtureDrawing'] | null;
}

/** Sentences by the path of the field that they stand under. */
export type FieldSentences = Record<string, string>;

export interface FormReading {
  /** Null while a value cannot be read. */
  boardType: BoardType | null;
  unreadable: FieldSentences;
}

type Sides = Pick<BoardTypeForm, 'travelUnit' | 'sensing'>;

const rowsOf = (rows: typeof limitRows) =>
  rows.flatMap(({ min, max }) => [min, max].filter((each) => each !== undefined));

/** Every number of a board type, in the order of the page. */
export function numberFields({ travelUnit, sensing }: Sides): NumberField[] {
  const { travel, backlash } = travelFields(travelUnit);
  return [
    ...[...drawnParts, ...undrawnParts].flatMap((part) => part.fields),
    travel,
    backlash,
    ...rowsOf(limitRows),
    absoluteMaximumField,
    sensing === 'output-voltage' ? thresholdVoltsField : thresholdAmpsField,
    ...rowsOf(searchRows),
    mostAttemptsField,
  ];
}

/** Degrees are kept as turns. */
const factorOf = ({ path, style }: NumberField) =>
  path.startsWith('trimmer.') && style === degreesStyle ? degreesATurn : 1;

/** Text of one number as the page writes it. */
export function writeField(field: NumberField, value: number): string {
  return writeQuantity(Number((value * factorOf(field)).toPrecision(12)), field.style);
}

export const travelUnitOf = ({ travelUnit, trimmer }: Pick<BoardType, 'travelUnit' | 'trimmer'>) =>
  travelUnit ?? (trimmer.turns > 1 ? 'turns' : 'degrees');

export function formOf(boardType: BoardType): BoardTypeForm {
  const sides = { travelUnit: travelUnitOf(boardType), sensing: boardType.sensing.kind };
  const whole = { ...boardType, tolerances: tolerancesOf(boardType) };
  return {
    ...sides,
    texts: Object.fromEntries(
      numberFields(sides).map((field) => [field.path, writeField(field, valueAt(whole, field.path) as number)]),
    ),
    name: boardType.name,
    serialPattern: boardType.serialPattern,
    clockwise: boardType.trimmer.clockwise,
    label: boardType.label ?? { typeLine: true, pointsLine: true },
    trimmerPhoto: boardType.trimmerPhoto ?? null,
    fixtureDrawing: boardType.fixtureDrawing ?? null,
  };
}

/** Reads all fields. What the schema refuses stands under its field as well. */
export function readForm(form: BoardTypeForm, code: string): FormReading {
  const unreadable: FieldSentences = {};
  const made: Record<string, unknown> = {};
  for (const field of numberFields(form)) {
    const read = readQuantity(form.texts[field.path] ?? '', field.style);
    if (!read.ok) unreadable[field.path] = read.sentence;
    else put(made, field.path, read.value / factorOf(field));
  }
  put(made, 'trimmer.clockwise', form.clockwise);
  put(made, 'sensing.kind', form.sensing);
  const parsed = boardTypeSchema.safeParse({
    ...made,
    code,
    name: form.name.trim(),
    serialPattern: form.serialPattern.trim(),
    travelUnit: form.travelUnit,
    label: form.label,
    trimmerPhoto: form.trimmerPhoto ?? undefined,
    fixtureDrawing: form.fixtureDrawing ?? undefined,
  });
  if (!parsed.success)
    for (const { path, message, code: problem } of parsed.error.issues) {
      const at = fieldAt(path.join('.'), form);
      unreadable[at] ??= problem === 'custom' ? message : shapeSentence(at, message);
    }
  const readable = parsed.success && Object.keys(unreadable).length === 0;
  return { boardType: readable ? parsed.data : null, unreadable };
}

/** A band is refused as a whole: its sentence stands under the upper limit. */
function fieldAt(path: string, sides: Sides): string {
  const fields = numberFields(sides);
  return fields.some((field) => field.path === path)
    ? path
    : (fields.find((field) => field.path === `${path}.max`)?.path ?? path);
}

function shapeSentence(path: string, message: string): string {
  if (/^(A|The|Use) /.test(message)) return message;
  if (path === 'name') return 'Use 3 to 80 characters.';
  if (path === 'serialPattern') return 'Use 3 to 120 characters.';
  if (path === 'mostAttempts') return 'Use a whole number from 1 to 10.';
  if (path === 'trimmer.turns') return 'A trimmer turns at most 40 times, and more than none.';
  if (path === 'trimmer.backlashTurns') return 'Backlash is at most half a turn, 180°.';
  if (path === 'tolerances.comparatorOffsetVolts') return 'An offset is at most 100 mV.';
  return 'The value must be above zero.';
}

export function valueAt(whole: object, path: string): unknown {
  return path.split('.').reduce<unknown>((at, key) => (at as Record<string, unknown> | undefined)?.[key], whole);
}

function put(whole: Record<string, unknown>, path: string, value: unknown): void {
  const keys = path.split('.');
  const last = keys.pop()!;
  let at = whole;
  for (const key of keys) at = (at[key] ??= {}) as Record<string, unknown>;
  at[last] = value;
}

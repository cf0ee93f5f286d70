import { z } from 'zod';
import { boardTypeSchema } from '../contracts/board-type';
import { readJson } from './json-places';
import { reasonOf } from './issue-words';
import { decisionRuleSchema, sequenceSchema, stepSchema, type Sequence } from './step';

/** A sequence as a file: our own format, of which the number says how it is read. */
export const sequenceFileSchema = z.object({
  format: z.literal('sillwright-sequence'),
  version: z.literal(1),
  boardType: boardTypeSchema.shape.code,
  name: z.string().trim().min(3).max(60),
  /** 7 is shown as r7; only told, never taken over. */
  revision: z.number().int().min(1),
  decisionRule: decisionRuleSchema,
  steps: z.array(stepSchema).min(2).max(80),
});
export type SequenceFile = z.infer<typeof sequenceFileSchema>;

/** JSON Schema (draft 2020-12) that files are published against. */
export function sequenceFileJsonSchema(): object {
  return { title: 'Sillwright test sequence, version 1', ...z.toJSONSchema(sequenceFileSchema) };
}

export function writeSequenceFile(
  { decisionRule, steps }: Sequence,
  of: { boardType: string; name: string; revision: number },
): string {
  return `${JSON.stringify({ format: 'sillwright-sequence', version: 1, ...of, decisionRule, steps }, null, 2)}\n`;
}

/** What is wrong in a file, and where. `field` is empty for the file as a whole. */
export interface FileProblem {
  line: number;
  field: string;
  reason: string;
}

export type ReadSequenceFile =
  | { ok: true; file: SequenceFile; lineOf(path: readonly PropertyKey[]): number }
  | { ok: false; problems: FileProblem[] };

/** Reads a file; every problem that can be told at once is told. */
export function readSequenceFile(text: string): ReadSequenceFile {
  const json = readJson(text);
  if (!json.ok) return { ok: false, problems: [{ line: json.line, field: '', reason: json.reason }] };
  const { value, lineOf } = json;
  const problems = json.repeated.map(({ line, key }) => ({ line, field: key, reason: 'It is given twice.' }));
  const add = (path: readonly PropertyKey[], reason: string) =>
    problems.push({ line: lineOf(path), field: fieldPath(path), reason });
  const parsed = sequenceFileSchema.safeParse(value);
  for (const issue of parsed.error?.issues ?? []) add(issue.path, reasonOf(issue, value));
  if (parsed.success) {
    for (const path of unknownFields(value, parsed.data)) add(path, 'The format has no such field.');
    for (const path of repeatedIds(parsed.data.steps)) add(path, 'Another step has this id.');
  }
  if (parsed.success && problems.length === 0) return { ok: true, file: parsed.data, lineOf };
  return { ok: false, problems: problems.sort((a, b) => a.line - b.line) };
}

export const sequenceOf = ({ decisionRule, steps }: SequenceFile): Sequence =>
  sequenceSchema.parse({ decisionRule, steps });

/** contactCheck.volts; a step by its number as the editor shows it: "step 2, volts". */
function fieldPath([first, place, ...rest]: readonly PropertyKey[]): string {
  if (first !== 'steps' || typeof place !== 'number')
    return [first, place, ...rest]
      .filter((key) => key !== undefined)
      .map(String)
      .join('.');
  return [`step ${place + 1}`, ...(rest.length > 0 ? [rest.map(String).join('.')] : [])].join(', ');
}

function unknownFields(given: unknown, known: unknown, path: PropertyKey[] = []): PropertyKey[][] {
  if (given === null || typeof given !== 'object' || known === null || typeof known !== 'object') return [];
  return Object.entries(given).flatMap(([name, value]) => {
    const key = Array.isArray(given) ? Number(name) : name;
    return Object.hasOwn(known, name)
      ? unknownFields(value, (known as Record<string, unknown>)[name], [...path, key])
      : [[...path, key]];
  });
}

const repeatedIds = (steps: Sequence['steps']): PropertyKey[][] =>
  steps.flatMap(({ id }, i) => (steps.findIndex((step) => step.id === id) < i ? [['steps', i, 'id']] : []));

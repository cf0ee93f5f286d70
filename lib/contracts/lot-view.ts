import { z } from 'zod';
import { runRules, type RunRule } from '../statistics/charts/run-rules';
import { chartQuantities, intervalMethods } from './lot-review';

export const boardChoices = ['all', 'undecided', 'rejected', 'untested'] as const;
export type BoardChoice = (typeof boardChoices)[number];

export const boardSorts = ['position', 'serial', 'verdict', 'trip', 'release', 'runs', 'label', 'ended'] as const;
export type BoardSort = (typeof boardSorts)[number];

/** Rows of a page of the table of boards. */
export const boardsPerPage = 50;

const listOfRules = z
  .string()
  .regex(/^([1-8](,[1-8])*)?$/)
  .catch('1,2')
  .transform((text) => runRules.filter((rule) => text.split(',').includes(String(rule))));

/**
 * The query part of a lot's address: what is shown of it, so that a reload or a colleague sees the same. Anything unknown
 * falls back to what is shown without it.
 */
export const lotViewSchema = z.object({
  quantity: z.enum(chartQuantities).catch('trip-volts'),
  rules: listOfRules,
  interval: z.enum(intervalMethods).catch('exact'),
  /** `station`, `operator`, `hour`, or `batch:` and the component. */
  compare: z.string().min(1).max(90).catch('station'),
  found: z.enum(['hidden', 'shown']).catch('hidden'),
  as: z.enum(['charts', 'tables']).catch('charts'),
  boards: z.enum(boardChoices).catch('all'),
  sort: z.enum(boardSorts).catch('position'),
  order: z.enum(['rising', 'falling']).catch('rising'),
  page: z.coerce.number().int().min(1).max(10_000).catch(1),
});
export type LotView = z.infer<typeof lotViewSchema>;

const usual = lotViewSchema.parse({});

const textOf = (value: LotView[keyof LotView]) => (Array.isArray(value) ? value.join(',') : String(value));

/** The address's query for a view; what is shown anyway is left out. */
export function lotViewQuery(view: LotView): string {
  const names = Object.keys(usual) as (keyof LotView)[];
  const parts = names.filter((name) => textOf(view[name]) !== textOf(usual[name]));
  return new URLSearchParams(parts.map((name) => [name, textOf(view[name])])).toString();
}

export const withRule = (rules: readonly RunRule[], rule: RunRule, on: boolean): RunRule[] =>
  runRules.filter((each) => (each === rule ? on : rules.includes(each)));

import { z } from 'zod';
import { runRules, type RunRule } from '../statistics/charts/run-rules';
import { setHoldRulesSchema, type HoldRuleSet } from './lot-hold';

const whole = (least: number, most: number) =>
  z
    .string()
    .trim()
    .regex(/^\d+$/, { error: `Enter a whole number from ${least} to ${most}.` })
    .transform(Number)
    .refine((n) => n >= least && n <= most, { error: `Enter a whole number from ${least} to ${most}.` });

const runRule = z.discriminatedUnion('on', [
  z
    .object({ on: z.literal(true), times: whole(1, 10), within: whole(1, 100) })
    .refine(({ times, within }) => within >= times, {
      error: 'So many times need at least as many boards.',
      path: ['within'],
    }),
  z.object({ on: z.literal(false), times: z.string(), within: z.string() }),
]);

/** The rules as sentences with gaps, written as text; what they mean is what the action takes. */
export const holdRulesFormSchema = z
  .object({
    code: z.string(),
    /** By number of the rule, from rule 1. */
    runRules: z.array(runRule).length(runRules.length),
    yieldFloor: z.discriminatedUnion('on', [
      z.object({ on: z.literal(true), percent: whole(1, 100), boards: whole(10, 500) }),
      z.object({ on: z.literal(false), percent: z.string(), boards: z.string() }),
    ]),
    sameReason: z.discriminatedUnion('on', [
      z.object({ on: z.literal(true), times: whole(2, 20) }),
      z.object({ on: z.literal(false), times: z.string() }),
    ]),
    failedCheck: z.boolean(),
    reason: z.string(),
  })
  .transform(({ code, reason, ...entered }) => ({
    code,
    reason,
    rules: {
      runRules: entered.runRules.flatMap((each, i) =>
        each.on ? [{ rule: runRules[i]!, times: each.times, within: each.within }] : [],
      ),
      yieldFloor: entered.yieldFloor.on
        ? { least: entered.yieldFloor.percent / 100, boards: entered.yieldFloor.boards }
        : null,
      sameReason: entered.sameReason.on ? { times: entered.sameReason.times } : null,
      failedCheck: entered.failedCheck,
    },
  }))
  .pipe(setHoldRulesSchema);
export type EnteredHoldRules = z.input<typeof holdRulesFormSchema>;

const usualYield = { percent: '90', boards: '50' };

/** The form filled with rules; gaps of rules that do not count hold what is usual. */
export function enteredHoldRules(code: string, rules: HoldRuleSet): EnteredHoldRules {
  const ruleOf = (rule: RunRule) => rules.runRules.find((each) => each.rule === rule);
  return {
    code,
    runRules: runRules.map((rule) => {
      const set = ruleOf(rule);
      return { on: set !== undefined, times: String(set?.times ?? 1), within: String(set?.within ?? 1) };
    }),
    yieldFloor: rules.yieldFloor
      ? { on: true, percent: String(Math.round(rules.yieldFloor.least * 100)), boards: String(rules.yieldFloor.boards) }
      : { on: false, ...usualYield },
    sameReason: { on: rules.sameReason !== null, times: String(rules.sameReason?.times ?? 3) },
    failedCheck: rules.failedCheck,
    reason: '',
  };
}

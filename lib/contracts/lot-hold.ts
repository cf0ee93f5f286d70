import { z } from 'zod';
import type { HoldRule } from '../statistics/charts/hold-rules';

/** What holds a lot by itself, per board type. */
export const holdRuleSetSchema = z.object({
  /** Run rules on the first-attempt verified trip values, in standard deviations from the frozen centre. */
  runRules: z
    .array(
      z.object({
        rule: z.literal([1, 2, 3, 4, 5, 6, 7, 8]),
        times: z.number().int().min(1).max(10),
        within: z.number().int().min(1).max(100),
      }),
    )
    .max(8),
  /** First-pass yield below `least` over the last `boards` boards. Null: not used. */
  yieldFloor: z.object({ least: z.number().min(0.01).max(1), boards: z.number().int().min(10).max(500) }).nullable(),
  /** The same reason so many times in a row. Null: not used. */
  sameReason: z.object({ times: z.number().int().min(2).max(20) }).nullable(),
  /** The station's daily check failed after boards of the lot were passed there. */
  failedCheck: z.boolean(),
});
export type HoldRuleSet = z.infer<typeof holdRuleSetSchema>;

/** What a rule saw. Boards are places in test order from 1. */
export type HoldDetail =
  | { cause: 'run-rule'; holdRule: HoldRule; fromBoard: number; toBoard: number; stationCode: string | null }
  | { cause: 'yield-floor'; passed: number; boards: number; least: number }
  | { cause: 'same-reason'; reason: string; times: number; stationCode: string | null }
  | { cause: 'failed-check'; stationCode: string; lastGoodCheckIso: string | null; suspectBoards: number };

const reason = z
  .string()
  .trim()
  .min(1, { error: 'Enter the reason.' })
  .max(300, { error: 'Use at most 300 characters.' });

/** What the action takes. `code` is the board type's. */
export const setHoldRulesSchema = z.object({ code: z.string().min(1).max(40), rules: holdRuleSetSchema, reason });
export type SetHoldRules = z.infer<typeof setHoldRulesSchema>;

/** Rules as they stood and stand, newest first. */
export interface HoldRulesPage {
  code: string;
  name: string;
  rules: HoldRuleSet;
  /** Empty: nobody has set any, the usual ones count. */
  history: { setBy: string; setIso: string; reason: string }[];
}

import { describe, expect, it } from 'vitest';
import { enteredHoldRules, holdRulesFormSchema } from '@/lib/contracts/hold-rules-form';
import { usualRuleSet } from '@/lib/quality/hold-cause';

const usual = () => ({ ...enteredHoldRules('CB1210', usualRuleSet), reason: 'Tried on ten lots' });

describe('rules as sentences with gaps', () => {
  it('mean the rules they were filled with', () => {
    expect(holdRulesFormSchema.parse(usual())).toEqual({
      code: 'CB1210',
      rules: usualRuleSet,
      reason: 'Tried on ten lots',
    });
    const all = {
      ...usualRuleSet,
      yieldFloor: { least: 0.85, boards: 40 },
      sameReason: null,
      failedCheck: false,
    };
    expect(holdRulesFormSchema.parse({ ...enteredHoldRules('CB1210', all), reason: 'x' }).rules).toEqual(all);
  });

  it.each([
    ['', 'Enter a whole number from 1 to 10.'],
    ['1.5', 'Enter a whole number from 1 to 10.'],
    ['11', 'Enter a whole number from 1 to 10.'],
  ])('refuse "%s" times beside the gap', (times, sentence) => {
    const entered = usual();
    entered.runRules[0] = { on: true, times, within: '10' };
    const [issue] = holdRulesFormSchema.safeParse(entered).error!.issues;
    expect(issue).toMatchObject({ path: ['runRules', 0, 'times'], message: sentence });
  });

  it('refuse more times than boards', () => {
    const entered = usual();
    entered.runRules[0] = { on: true, times: '3', within: '2' };
    expect(holdRulesFormSchema.safeParse(entered).error!.issues[0]!.path).toEqual(['runRules', 0, 'within']);
  });

  it('do not ask for the gaps of a rule that does not count', () => {
    const entered = usual();
    entered.runRules[7] = { on: false, times: '', within: 'many' };
    entered.yieldFloor = { on: false, percent: '', boards: '' };
    expect(holdRulesFormSchema.parse(entered).rules).toEqual(usualRuleSet);
  });
});

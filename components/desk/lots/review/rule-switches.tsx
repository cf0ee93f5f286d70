import { CheckField } from '@/components/ui/check-field';
import type { LotReview } from '@/lib/contracts/lot-review';
import { withRule } from '@/lib/contracts/lot-view';
import { ruleWords, stretchList } from '@/lib/quality/run-words';
import { runRules } from '@/lib/statistics/charts/run-rules';
import type { LotSectionProps } from '../lot-section';

type RuleSwitchesProps = Pick<LotSectionProps, 'view' | 'changeView'> & { review: LotReview };

const mostTold = 12;

/** Nelson's eight rules, each switched by itself, and what the chosen ones find. */
export function RuleSwitches({ review, view, changeView }: RuleSwitchesProps) {
  const { stretches, broken, baseline } = review;
  const told = stretchList(stretches);
  return (
    <div>
      <fieldset>
        <legend className="text-cap text-ink-2">Marked and counted as not stable</legend>
        {runRules.map((rule) => (
          <CheckField
            key={rule}
            label={`${rule}  ${ruleWords[rule]}`}
            hint={
              baseline.kind === 'frozen' && broken[rule] > 0
                ? `broken at ${broken[rule]} ${broken[rule] === 1 ? 'board' : 'boards'}`
                : undefined
            }
            checked={view.rules.includes(rule)}
            onChange={(event) => changeView({ rules: withRule(view.rules, rule, event.target.checked) })}
          />
        ))}
      </fieldset>
      {baseline.kind !== 'frozen' ? null : stretches.length === 0 ? (
        <p className="mt-3">No chosen rule is broken.</p>
      ) : (
        <ul className="mt-3 border-t border-hair pt-2" aria-label="Broken rules">
          {told.slice(0, mostTold).map(({ rule, words }) => (
            <li key={words}>
              <b>Rule {rule}</b> {words}
            </li>
          ))}
          {told.length > mostTold ? <li className="text-ink-2">and {told.length - mostTold} more</li> : null}
        </ul>
      )}
    </div>
  );
}

'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch, type UseFormRegisterReturn } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { CheckField } from '@/components/ui/check-field';
import { FillIn } from '@/components/ui/fill-in';
import { TextAreaField } from '@/components/ui/text-area-field';
import { useToast } from '@/components/ui/toast';
import { enteredHoldRules, holdRulesFormSchema, type EnteredHoldRules } from '@/lib/contracts/hold-rules-form';
import type { HoldRulesPage, SetHoldRules } from '@/lib/contracts/lot-hold';
import type { Outcome } from '@/lib/contracts/outcome';
import { ruleWords } from '@/lib/quality/run-words';
import { runRules } from '@/lib/statistics/charts/run-rules';
import { FormProblem } from '../form-problem';
import { useActionForm } from '../use-action-form';
import { FalseHoldsSentence } from './false-holds-sentence';
import { RuleLine } from './rule-line';

interface HoldRulesFormProps {
  page: HoldRulesPage;
  mayEdit: boolean;
  set: (input: unknown) => Promise<Outcome>;
}

/** What holds a lot of a board type by itself: sentences with gaps, and what they cost where nothing is wrong. */
export function HoldRulesForm({ page, mayEdit, set }: HoldRulesFormProps) {
  const toast = useToast();
  const form = useForm<EnteredHoldRules, unknown, SetHoldRules>({
    resolver: zodResolver(holdRulesFormSchema),
    defaultValues: enteredHoldRules(page.code, page.rules),
  });
  const { send, problem, sending } = useActionForm(form, set, () => {
    form.setValue('reason', '');
    toast(`The rules of ${page.code} count from the next board on`);
  });
  const { errors } = form.formState;
  const entered = useWatch({ control: form.control }) as EnteredHoldRules;
  // Judged without the reason, which does not change the figure.
  const parsed = holdRulesFormSchema.safeParse({ ...entered, reason: 'x' });
  return (
    <form noValidate onSubmit={(event) => event.preventDefault()}>
      <fieldset disabled={!mayEdit} className="contents">
        <h2 className="border-t-2 border-ink pt-2.5 font-bold">
          Trip points of first attempts, against the frozen limits
        </h2>
        <ul>
          {runRules.map((rule, i) => (
            <RuleLine key={rule} errors={[errors.runRules?.[i]?.times?.message, errors.runRules?.[i]?.within?.message]}>
              <CheckField
                {...form.register(`runRules.${i}.on`)}
                label={`Rule ${rule}: ${ruleWords[rule].toLowerCase()}, seen`}
              />
              <Gap
                label={`Times of rule ${rule}`}
                size={2}
                wrong={errors.runRules?.[i]?.times}
                {...form.register(`runRules.${i}.times`)}
              />{' '}
              × within{' '}
              <Gap
                label={`Boards of rule ${rule}`}
                size={3}
                wrong={errors.runRules?.[i]?.within}
                {...form.register(`runRules.${i}.within`)}
              />{' '}
              boards
            </RuleLine>
          ))}
        </ul>
        <div className="my-5">
          <FalseHoldsSentence rules={parsed.success ? parsed.data.rules.runRules : null} />
        </div>
        <h2 className="border-t-2 border-ink pt-2.5 font-bold">Rejects and checks</h2>
        <ul>
          <RuleLine errors={[errors.yieldFloor?.percent?.message, errors.yieldFloor?.boards?.message]}>
            <CheckField {...form.register('yieldFloor.on')} label="Fewer than" />
            <Gap
              label="First-pass yield, percent"
              size={3}
              wrong={errors.yieldFloor?.percent}
              {...form.register('yieldFloor.percent')}
            />{' '}
            % of the last{' '}
            <Gap
              label="Boards of the yield"
              size={3}
              wrong={errors.yieldFloor?.boards}
              {...form.register('yieldFloor.boards')}
            />{' '}
            boards passed first time
          </RuleLine>
          <RuleLine errors={[errors.sameReason?.times?.message]}>
            <CheckField {...form.register('sameReason.on')} label="The same reason" />
            <Gap
              label="Rejects in a row"
              size={2}
              wrong={errors.sameReason?.times}
              {...form.register('sameReason.times')}
            />{' '}
            × in a row
          </RuleLine>
          <RuleLine errors={[]}>
            <CheckField
              {...form.register('failedCheck')}
              label="The station’s daily check failed after boards of the lot were passed there"
            />
          </RuleLine>
        </ul>
      </fieldset>
      {mayEdit ? (
        <div className="mt-5 grid max-w-[560px] gap-4">
          <TextAreaField
            {...form.register('reason')}
            label="Reason for the change"
            rows={2}
            error={errors.reason?.message}
          />
          <FormProblem problem={problem} />
          <div>
            <Button kind="filled" onClick={() => void send()} pending={sending ? 'Storing' : null}>
              Set the rules
            </Button>
          </div>
        </div>
      ) : null}
    </form>
  );
}

/** A gap for a whole number. */
function Gap({
  label,
  size,
  wrong,
  ...field
}: UseFormRegisterReturn & { label: string; size: number; wrong: unknown }) {
  return (
    <FillIn
      {...field}
      label={label}
      aria-invalid={wrong ? true : undefined}
      size={size}
      inputMode="numeric"
      className="text-center"
    />
  );
}

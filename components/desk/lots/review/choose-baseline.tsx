'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { valueText } from '@/components/charts/quality/quantity-look';
import { Button } from '@/components/ui/button';
import { CheckField } from '@/components/ui/check-field';
import { Dialog } from '@/components/ui/dialog';
import { SelectField } from '@/components/ui/select-field';
import { TextAreaField } from '@/components/ui/text-area-field';
import { useToast } from '@/components/ui/toast';
import { chooseBaselineSchema, type BaselineCandidate, type LotReview } from '@/lib/contracts/lot-review';
import { fetchJson } from '../../fetch-json';
import { FormProblem } from '../../form-problem';
import { useActionForm } from '../../use-action-form';
import type { LotSectionProps } from '../lot-section';

type ChooseBaselineProps = Pick<LotSectionProps, 'lot' | 'actions' | 'onChanged'> & { review: LotReview };

const scopes = [
  { value: 'lot', label: 'this lot' },
  { value: 'board-type', label: 'every lot of this board type made from now on' },
];

/** Draws the chart from earlier lots instead of the lot's own first boards, with a reason. */
export function ChooseBaseline(props: ChooseBaselineProps) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <button type="button" className="sw-link sw-screen-only text-cap" onClick={() => setOpen(true)}>
        Take limits from earlier lots…
      </button>
      {open ? <ChooseBaselineDialog {...props} onClose={() => setOpen(false)} /> : null}
    </>
  );
}

function ChooseBaselineDialog({
  lot,
  review,
  actions,
  onChanged,
  onClose,
}: ChooseBaselineProps & { onClose: () => void }) {
  const toast = useToast();
  const { quantity } = review;
  const candidates = useQuery({
    queryKey: ['lot-baselines', lot.code, quantity],
    queryFn: ({ signal }) =>
      fetchJson<BaselineCandidate[]>(
        `/api/lots/${encodeURIComponent(lot.code)}/baselines?quantity=${quantity}`,
        signal,
      ),
  });
  const form = useForm({
    resolver: zodResolver(chooseBaselineSchema),
    defaultValues: { lotId: lot.id, quantity, fromLotIds: [] as string[], scope: 'lot' as const, reason: '' },
  });
  const { errors } = form.formState;
  const sending = useActionForm(form, actions.chooseBaseline, () => {
    toast('Control limits are drawn from the chosen lots');
    onClose();
    onChanged();
  });
  return (
    <Dialog
      open
      onOpenChange={(next) => !next && onClose()}
      title="Take the control limits from earlier lots?"
      consequence="Limits stay frozen as they are computed now. Your reason is recorded."
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void sending.send()} pending={sending.sending ? 'Storing' : null}>
            Take these limits
          </Button>
          <Button kind="link" onClick={onClose}>
            Keep the limits
          </Button>
        </>
      }
    >
      <fieldset>
        <legend className="text-cap text-ink-2">Lots of {lot.boardTypeCode} made before, with 30 boards or more</legend>
        {candidates.data?.length === 0 ? <p>There is none yet.</p> : null}
        {candidates.isError ? <p>The lots did not load. Close this and try again.</p> : null}
        {candidates.data?.map(({ lotId, code, boards, mean, stable }) => (
          <CheckField
            key={lotId}
            {...form.register('fromLotIds')}
            value={lotId}
            disabled={!stable}
            label={code}
            hint={`${boards} boards, centre ${valueText(quantity, mean)}${stable ? '' : ', not stable'}`}
          />
        ))}
      </fieldset>
      {errors.fromLotIds ? <FormProblem problem={errors.fromLotIds.message ?? null} /> : null}
      <SelectField {...form.register('scope')} label="For" choices={scopes} />
      <TextAreaField {...form.register('reason')} label="Reason" error={errors.reason?.message} />
      <FormProblem problem={sending.problem} />
    </Dialog>
  );
}

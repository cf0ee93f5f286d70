'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useQuery } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { Button } from '@/components/ui/button';
import { ChoiceField } from '@/components/ui/choice-field';
import { Dialog } from '@/components/ui/dialog';
import { TextAreaField } from '@/components/ui/text-area-field';
import type { Outcome } from '@/lib/contracts/outcome';
import { offerDraftSchema } from '@/lib/contracts/sequence-draft';
import type { StationRow, StationsOverview } from '@/lib/contracts/station-overview';
import { fetchJson } from '../fetch-json';
import { FormProblem } from '../form-problem';
import { stationStateWords } from '@/components/desk/stations/station-words';
import { useActionForm } from '../use-action-form';

export type OfferDraft = z.infer<typeof offerDraftSchema>;

interface OfferDialogProps {
  open: boolean;
  onClose: () => void;
  revisionId: string;
  /** 7 is shown as r7. */
  revisionNumber: number;
  /** offerDraftAction. */
  offer: (input: OfferDraft) => Promise<Outcome<{ offerId: string }>>;
  onOffered: (stationCode: string) => void;
}

/** Offers the draft, as it is saved now, to a station. Nothing runs until somebody starts it at that bench. */
export function OfferDialog({ open, onClose, revisionId, revisionNumber, offer, onOffered }: OfferDialogProps) {
  const stations = useQuery({
    queryKey: ['stations'],
    queryFn: ({ signal }) => fetchJson<StationsOverview>('/api/stations', signal),
    enabled: open,
  });
  const form = useForm<OfferDraft>({
    resolver: zodResolver(offerDraftSchema),
    defaultValues: { revisionId, stationCode: '', note: '' },
  });
  const { send, problem, sending } = useActionForm(form, offer, () => {
    const { stationCode } = form.getValues();
    form.reset();
    onOffered(stationCode);
  });
  const { errors } = form.formState;
  const inOrder = [...(stations.data?.stations ?? [])].sort((a, b) => a.code.localeCompare(b.code, 'en'));
  return (
    <Dialog
      open={open}
      onOpenChange={(next) => !next && onClose()}
      title={`Try draft r${revisionNumber} on a station?`}
      consequence="The bench is offered the draft as it is saved now. It runs when somebody starts it there, as engineering runs that count in no yield."
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Offering' : null}>
            Offer the draft
          </Button>
          <Button kind="link" onClick={onClose}>
            Not now
          </Button>
        </>
      }
    >
      <ChoiceField
        {...form.register('stationCode')}
        legend="Station"
        choices={inOrder.map((station) => ({ value: station.code, label: stationWords(station) }))}
      />
      {stations.isPending && open ? <p className="text-ink-2">Reading the stations.</p> : null}
      {stations.isError ? (
        <p className="text-reject">The stations could not be read. Close this and try again.</p>
      ) : null}
      {errors.stationCode ? (
        <p role="alert" className="text-reject">
          {errors.stationCode.message}
        </p>
      ) : null}
      <TextAreaField
        {...form.register('note')}
        label="Note for the bench"
        hint="What to try, which boards to use. The bench shows it."
        rows={2}
        error={errors.note?.message}
      />
      <FormProblem problem={problem} />
    </Dialog>
  );
}

function stationWords({ name, fixture, state, offer }: StationRow): string {
  const now = stationStateWords[state].toLowerCase();
  return `${name}, ${fixture}: ${offer ? `has r${offer.revisionNumber} on offer, ` : ''}${now}`;
}

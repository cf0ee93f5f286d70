// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { DeskQuery } from '@/components/desk/desk-query';
import { OfferDialog } from '@/components/desk/offers/offer-dialog';
import { OfferResults } from '@/components/desk/offers/offer-results';
import { ToastProvider } from '@/components/ui/toast';
import type { OfferedDraft, OfferRun } from '@/lib/contracts/engineering-offer';
import type { Outcome } from '@/lib/contracts/outcome';
import type { StationRow } from '@/lib/contracts/station-overview';

const revisionId = '0c7d2f5e-6f0a-4a57-9d55-2b8c5b7f1a01';

const station = (code: string, over: Partial<StationRow> = {}): StationRow => ({
  id: code,
  code,
  name: `Station ${code.slice(1)}`,
  fixture: `F${code.slice(1)}`,
  simulated: true,
  state: 'idle',
  sinceIso: null,
  reasons: [],
  rejectReason: null,
  serial: null,
  operatorNumber: null,
  lot: null,
  call: null,
  engineering: false,
  offer: null,
  ...over,
});

let answers: unknown;
beforeEach(() => {
  vi.stubGlobal('fetch', async () => Response.json(answers));
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const shown = (children: React.ReactNode) =>
  render(
    <DeskQuery>
      <ToastProvider>{children}</ToastProvider>
    </DeskQuery>,
  );

function openDialog(outcome: Outcome<{ offerId: string }>) {
  answers = { atIso: '', stations: [station('S2', { state: 'testing' }), station('S1', { state: 'may-not-test' })] };
  const offer = vi.fn(async () => outcome);
  const onOffered = vi.fn();
  shown(
    <OfferDialog
      open
      onClose={() => {}}
      revisionId={revisionId}
      revisionNumber={7}
      offer={offer}
      onOffered={onOffered}
    />,
  );
  return { offer, onOffered };
}

it('offers the draft to the chosen station, with the state of each and a note for its bench', async () => {
  const { offer, onOffered } = openDialog({ ok: true, value: { offerId: 'o' } });
  const choices = await screen.findAllByRole('radio');
  expect(choices.map((each) => each.closest('div')!.textContent)).toEqual([
    'Station 1, F1: may not test',
    'Station 2, F2: testing',
  ]);
  fireEvent.click(choices[1]!);
  fireEvent.change(screen.getByLabelText('Note for the bench'), { target: { value: 'Ten boards.' } });
  fireEvent.click(screen.getByRole('button', { name: 'Offer the draft' }));
  await waitFor(() => expect(onOffered).toHaveBeenCalledExactlyOnceWith('S2'));
  expect(offer).toHaveBeenCalledWith({ revisionId, stationCode: 'S2', note: 'Ten boards.' });
});

it('asks for a station, and shows a refusal beside the stations with the note kept', async () => {
  const sentence = 'Station 2 has r6 on offer from K. Osei. End that offer first.';
  const { offer } = openDialog({ ok: false, code: 'station-has-offer', sentence, field: 'stationCode' });
  const choices = await screen.findAllByRole('radio');
  fireEvent.change(screen.getByLabelText('Note for the bench'), { target: { value: 'Ten boards.' } });
  fireEvent.click(screen.getByRole('button', { name: 'Offer the draft' }));
  expect((await screen.findByRole('alert')).textContent).toBe('Choose a station.');
  expect(offer).not.toHaveBeenCalled();
  fireEvent.click(choices[1]!);
  fireEvent.click(screen.getByRole('button', { name: 'Offer the draft' }));
  await screen.findByText(sentence);
  expect(screen.getByLabelText<HTMLTextAreaElement>('Note for the bench').value).toBe('Ten boards.');
});

const run = (over: Partial<OfferRun>): OfferRun => ({
  id: 'r1',
  serial: 'CB1210264800184',
  attempt: 1,
  startedIso: '2026-12-01T13:02:00Z',
  operatorName: 'M. Adeyemi',
  verdict: 'pass',
  rejectReason: null,
  noVerdictReason: null,
  seconds: 38.4,
  tripVolts: 10.812,
  releaseVolts: 12.23,
  hysteresisVolts: 1.42,
  ...over,
});

const offers: OfferedDraft[] = [
  {
    id: 'open',
    stationCode: 'S1',
    stationName: 'Station 1',
    note: '',
    offeredByName: 'T. Marsden',
    offeredIso: '2026-12-01T12:50:00Z',
    endedIso: null,
    endedByName: null,
    runs: [
      run({ id: 'now', verdict: null, seconds: null, tripVolts: null }),
      run({}),
      run({ id: 'r2', verdict: 'reject', rejectReason: 'release-too-high', releaseVolts: 12.71 }),
    ],
  },
  {
    id: 'over',
    stationCode: 'S2',
    stationName: 'Station 2',
    note: '',
    offeredByName: 'K. Osei',
    offeredIso: '2026-11-30T12:50:00Z',
    endedIso: '2026-11-30T13:50:00Z',
    endedByName: 'P. Castellan',
    runs: [],
  },
];

it('shows what each run gave in words and values, with the way to its record, and ends an open offer', async () => {
  answers = offers;
  const endOffer = vi.fn(async () => ({ ok: true, value: null }) as const);
  shown(<OfferResults revisionId={revisionId} initial={offers} endOffer={endOffer} />);
  const [, onFixture, passed, rejected] = within(screen.getByRole('table')).getAllByRole('row');
  expect(onFixture!.textContent).toContain('On the fixture');
  expect(passed!.textContent).toMatch(/Passed.*10\.81 V.*12\.23 V.*1\.42 V.*38/);
  expect(rejected!.textContent).toContain('Rejected, release point too high');
  expect(within(rejected!).getByRole('link').getAttribute('href')).toBe('/engineering-runs/r2');
  expect(screen.getByText('Was on offer at Station 2')).toBeTruthy();
  fireEvent.click(screen.getByRole('button', { name: 'End the offer' }));
  await waitFor(() => expect(endOffer).toHaveBeenCalledExactlyOnceWith({ offerId: 'open' }));
});

it('lets whoever may not make engineering runs look only', () => {
  answers = offers;
  shown(<OfferResults revisionId={revisionId} initial={offers} endOffer={null} />);
  expect(screen.queryByRole('button', { name: 'End the offer' })).toBeNull();
});

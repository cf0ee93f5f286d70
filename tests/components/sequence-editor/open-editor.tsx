import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import { vi } from 'vitest';
import { SequenceEditor } from '@/components/desk/sequence-editor/sequence-editor';
import { ToastProvider } from '@/components/ui/toast';
import { cb1210 } from '@/db/seed/board-types';
import type { Outcome } from '@/lib/contracts/outcome';
import type { DraftPage, RevisionHead, SavedDraft, SaveDraft } from '@/lib/contracts/sequence-draft';
import { freshStep } from '@/lib/sequence/draft-edits';
import type { Sequence, StepKind } from '@/lib/sequence/step';

const kinds: StepKind[] = ['seat', 'power-up', 'find-points', 'trim', 'verify', 'record'];
export const sequence: Sequence = {
  steps: kinds.map((kind, i) => freshStep(kind, `s${i + 1}`, cb1210)),
  decisionRule: { kind: 'simple' },
};

const head: RevisionHead = {
  id: '0d5f6a31-9d5e-4c11-8f67-2f9f4f7f1a01',
  number: 7,
  status: 'draft',
  version: 4,
  note: '',
  madeBy: 'T. Marsden',
  madeAtIso: '2026-11-29T08:00:00.000Z',
  savedBy: 'T. Marsden',
  savedAtIso: '2026-11-30T10:52:00.000Z',
  basedOnNumber: 6,
  submittedBy: null,
  submittedAtIso: null,
  sentBackBy: null,
  sentBackAtIso: null,
  sentBackReason: null,
  releasedBy: null,
  releasedAtIso: null,
  releaseMeaning: null,
  supersededAtIso: null,
  withdrawnBy: null,
  withdrawnAtIso: null,
  withdrawnReason: null,
  warningReasons: {},
};

export type Save = (form: SaveDraft) => Promise<Outcome<SavedDraft>>;

/** Answers as a server that stores everything. */
export const storing = () =>
  vi.fn<Save>(({ version }) =>
    Promise.resolve({ ok: true, value: { saved: true, version: version + 1, savedAtIso: '2026-11-30T10:53:00.000Z' } }),
  );

/** The editor as its page shows it, against a server that is only these functions. */
export function openEditor(change: Partial<DraftPage> = {}, save: Save = storing()) {
  const released = { head: { ...head, id: 'r6', number: 6, status: 'released' as const }, sequence };
  const page: DraftPage = {
    sequenceId: '5a5b7c0e-70cf-4f6c-b7a4-0c9f3c6a4d02',
    sequenceName: 'cutoff trim',
    boardType: cb1210,
    head,
    sequence,
    released,
    stations: [],
    mayEdit: true,
    mayRelease: false,
    ...change,
  };
  const never = () => new Promise<never>(() => {});
  return render(
    <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
      <ToastProvider>
        <SequenceEditor
          page={page}
          dryRun={null}
          offers={[]}
          actions={{
            save,
            submit: never,
            dryRun: { ask: never, cancel: never, keep: never },
            offer: null,
            endOffer: null,
          }}
        />
      </ToastProvider>
    </QueryClientProvider>,
  );
}

'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { LotPage } from '@/lib/contracts/lot-page';
import type { LotReview } from '@/lib/contracts/lot-review';
import { lotViewQuery } from '@/lib/contracts/lot-view';
import { CertificatesSection, type CertificatesGiven } from '../certificates/certificates-section';
import { fetchJson } from '../fetch-json';
import { StaleNote } from '../stale-note';
import { LotBoardsSection } from './lot-boards-section';
import { LotComponentsSection } from './lot-components-section';
import { LotFiguresSection } from './lot-figures-section';
import { LotHeadSection } from './lot-head-section';
import { LotRejectsSection } from './lot-rejects-section';
import { LotRevisionSection } from './lot-revision-section';
import { LotReviewSection } from './lot-review-section';
import type { LotSectionProps } from './lot-section';
import { useLotView } from './use-lot-view';

const refreshMs = 2_500;

interface LotLiveProps {
  initial: LotPage;
  initialReview: LotReview | null;
  certificates: CertificatesGiven;
  may: LotSectionProps['may'];
  actions: LotSectionProps['actions'];
  deciding: LotSectionProps['deciding'];
}

/** The page of a lot, fetched again every few seconds while the lot is in production. */
export function LotLive({ initial, initialReview, certificates, may, actions, deciding }: LotLiveProps) {
  const [view, changeView] = useLotView();
  const query = lotViewQuery(view);
  const [firstQuery] = useState(query);
  const isFirst = query === firstQuery;
  const address = `/api/lots/${encodeURIComponent(initial.code)}`;
  const page = useQuery({
    queryKey: ['lot', initial.code, view.boards, view.sort, view.order, view.page],
    queryFn: ({ signal }) => fetchJson<LotPage>(`${address}?${query}`, signal),
    initialData: isFirst ? initial : undefined,
    placeholderData: keepPreviousData,
    refetchInterval: ({ state }) => (state.data && state.data.state !== 'closed' ? refreshMs : false),
  });
  const lot = page.data ?? initial;
  const { quantity, rules, interval, compare } = view;
  // The figures are computed again when a run ended, not every few seconds.
  const ended = `${lot.summary.marks} ${lot.summary.runsWithoutVerdict} ${lot.lastTestIso}`;
  const [firstEnded] = useState(ended);
  const review = useQuery({
    queryKey: ['lot-review', initial.code, quantity, rules.join(), interval, compare, ended],
    queryFn: ({ signal }) => fetchJson<LotReview>(`${address}/review?${query}`, signal),
    initialData: isFirst && ended === firstEnded ? (initialReview ?? undefined) : undefined,
    placeholderData: keepPreviousData,
    staleTime: Infinity,
  });
  const section: LotSectionProps = {
    lot,
    view,
    changeView,
    may,
    actions,
    deciding,
    onChanged: () => {
      void page.refetch();
      void review.refetch();
    },
  };
  return (
    <>
      <LotHeadSection {...section} review={review.data ?? null} />
      {review.data ? <LotReviewSection {...section} review={review.data} /> : null}
      {lot.state !== 'closed' ? <StaleNote updatedAt={page.dataUpdatedAt} failing={page.isError} /> : null}
      <LotRejectsSection {...section} />
      {review.data ? <LotFiguresSection {...section} review={review.data} /> : null}
      <CertificatesSection
        {...certificates}
        subject={{ lotId: lot.id }}
        what={`lot ${lot.code}`}
        unavailable={unavailableFor(lot)}
      />
      <LotRevisionSection {...section} />
      <LotComponentsSection {...section} />
      <LotBoardsSection {...section} />
    </>
  );
}

/** Why the lot gets no certificate now; what the server alone knows, it says when asked. */
function unavailableFor({ hold, state, summary }: LotPage): string | null {
  if (hold) return 'The lot is on hold.';
  if (state === 'closed') return null;
  if (summary.tested < summary.size) return 'Boards of it are still to be tested.';
  return summary.undecided > 0 ? 'Boards of it wait for a decision. Decide, or close the lot.' : null;
}

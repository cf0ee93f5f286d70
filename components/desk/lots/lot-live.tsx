'use client';

import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { FillInChoice } from '@/components/ui/fill-in';
import { LotRule } from '@/components/ui/lot-rule';
import { PageHead, Section } from '@/components/ui/page-head';
import type { LotPage } from '@/lib/contracts/lot-page';
import type { Outcome } from '@/lib/contracts/outcome';
import { fetchJson } from '../fetch-json';
import { count } from '../numbers';
import { StaleNote } from '../stale-note';
import { ComponentBatches } from './component-batches';
import { LotActions, LotHold, LotSheetLink, type LotActionsOf } from './lot-actions';
import { LotBoardsTable, pickBoards, type BoardChoice } from './lot-boards-table';
import { LotLine, YieldSentence } from './lot-head';
import { LotRuleKey } from './lot-rule-key';
import { RejectPareto } from './reject-pareto';

const refreshMs = 2_500;

interface LotLiveProps {
  initial: LotPage;
  mayManage: boolean;
  mayHold: boolean;
  actions: LotActionsOf & { recordBatch: (input: unknown) => Promise<Outcome> };
}

const choices: { value: BoardChoice; label: string }[] = [
  { value: 'all', label: 'all' },
  { value: 'undecided', label: 'undecided' },
  { value: 'rejected', label: 'rejected' },
  { value: 'untested', label: 'untested' },
];

/** The page of a lot, fetched again every few seconds while the lot is in production. */
export function LotLive({ initial, mayManage, mayHold, actions }: LotLiveProps) {
  const query = useQuery({
    queryKey: ['lot', initial.code],
    queryFn: ({ signal }) => fetchJson<LotPage>(`/api/lots/${encodeURIComponent(initial.code)}`, signal),
    initialData: initial,
    refetchInterval: ({ state }) => (state.data && state.data.state !== 'closed' ? refreshMs : false),
  });
  const lot = query.data;
  const { summary } = lot;
  const [choice, setChoice] = useState<BoardChoice>('all');
  const shown = useMemo(() => pickBoards(lot.boards, choice), [lot.boards, choice]);
  const onChanged = () => void query.refetch();
  const live = lot.state !== 'closed';
  return (
    <>
      <div className="grid items-start gap-x-14 gap-y-5 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <div>
          <PageHead title={<>Lot {lot.code}</>} lede={<LotLine lot={lot} />} />
          <YieldSentence summary={summary} />
        </div>
        <div className="grid gap-4">
          <div className="flex flex-wrap items-center gap-3 lg:justify-end">
            <LotSheetLink code={lot.code} />
            {mayManage ? <LotActions lot={lot} actions={actions} onChanged={onChanged} /> : null}
          </div>
          <LotHold lot={lot} mayRelease={mayHold} actions={actions} onChanged={onChanged} />
        </div>
      </div>
      <Section title="Every board, in lot order" aside={<LotRuleKey />}>
        <LotRuleAtWidth
          marks={summary.marks}
          label={`${summary.tested} of ${summary.size} boards tested, ${summary.rejected} rejected, ${summary.passedLater} passed on a later attempt`}
        />
        {live ? <StaleNote updatedAt={query.dataUpdatedAt} failing={query.isError} /> : null}
      </Section>
      <div className="grid gap-x-12 lg:grid-cols-2">
        <Section title="Why boards were rejected">
          <RejectPareto reasons={summary.reasons} />
        </Section>
        <Section title="Component batches">
          <ComponentBatches
            lotId={lot.id}
            batches={lot.components}
            record={mayManage && live ? actions.recordBatch : null}
            onChanged={onChanged}
          />
        </Section>
      </div>
      <Section
        title={
          <span className="flex items-center gap-2 font-normal">
            Show{' '}
            <FillInChoice
              label="Boards"
              choices={choices}
              value={choice}
              onChange={(event) => setChoice(event.target.value as BoardChoice)}
            />{' '}
            boards
          </span>
        }
        aside={
          <span>
            <b>{count(shown.length)}</b> of {count(summary.size)}
            {summary.runsWithoutVerdict > 0 ? `, ${summary.runsWithoutVerdict} runs without a verdict` : ''}
          </span>
        }
      >
        <LotBoardsTable key={choice} boards={shown} boardTypeCode={lot.boardTypeCode} />
      </Section>
    </>
  );
}

/** Drawn for a desk and once more for a phone, since its marks do not shrink. */
function LotRuleAtWidth({ marks, label }: { marks: string; label: string }) {
  return (
    <>
      <div className="max-sm:hidden">
        <LotRule marks={marks} label={label} />
      </div>
      <div className="sm:hidden">
        <LotRule marks={marks} label={label} width={480} />
      </div>
    </>
  );
}

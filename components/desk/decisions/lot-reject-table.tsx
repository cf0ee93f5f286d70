'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import { useMemo, useState } from 'react';
import { LoadingTicks } from '@/components/ui/loading-ticks';
import { useToast } from '@/components/ui/toast';
import type { RejectPage, RejectRow } from '@/lib/contracts/reject-list';
import type { DispositionKind } from '@/lib/contracts/stored-states';
import { DataTable } from '../data-table';
import { fetchJson } from '../fetch-json';
import { DecisionButtons } from './decision-buttons';
import type { Deciding } from './deciding';
import { DispositionDialog } from './disposition-dialog';
import { measuredColumn, reasonColumn, rejectColumn, serialColumn } from './reject-columns';

const mostShown = 8;

interface LotRejectTableProps {
  lotCode: string;
  /** Changes when boards of the lot were tested or decided; the list is then fetched anew. */
  version: string;
  deciding: Deciding;
  onChanged: () => void;
}

/** Boards of a lot that wait for a decision, each with its buttons. */
export function LotRejectTable({ lotCode, version, deciding, onChanged }: LotRejectTableProps) {
  const toast = useToast();
  const [asking, setAsking] = useState<{ row: RejectRow; kind: DispositionKind } | null>(null);
  const query = useQuery({
    queryKey: ['rejects', lotCode, version],
    queryFn: ({ signal }) => fetchJson<RejectPage>(`/api/rejects?lot=${encodeURIComponent(lotCode)}`, signal),
    placeholderData: keepPreviousData,
    staleTime: Infinity,
  });
  const { kinds } = deciding;
  const columns = useMemo(
    () =>
      rejectColumn.columns([
        serialColumn,
        reasonColumn,
        measuredColumn,
        rejectColumn.display({
          id: 'decide',
          header: 'Decision',
          cell: ({ row: { original } }) => (
            <DecisionButtons
              kinds={kinds.filter((kind) => original.decidable.includes(kind))}
              of={`board ${original.serial.slice(-5)}`}
              onChoose={(kind) => setAsking({ row: original, kind })}
            />
          ),
        }),
      ]),
    [kinds],
  );
  if (!query.data)
    return query.isError ? (
      <p>The list did not load. Load the page again.</p>
    ) : (
      <LoadingTicks label="Reading the boards to decide about" />
    );
  const { rows, total } = query.data;
  return (
    <>
      <DataTable
        rows={rows.slice(0, mostShown)}
        columns={columns}
        rowKey={(row) => row.unitId}
        label="Boards that wait for a decision"
        empty={{ title: 'No board waits for a decision.' }}
      />
      {total > 0 ? (
        <p className="mt-2 text-ink-2">
          <Link className="sw-link" href={`/rejects?lot=${encodeURIComponent(lotCode)}`}>
            {total > mostShown ? `All ${total}, and many decided at once` : 'Many decided at once'}
          </Link>
        </p>
      ) : null}
      {asking ? (
        <DispositionDialog
          boards={[asking.row]}
          kinds={[asking.kind, ...kinds.filter((kind) => kind !== asking.kind && asking.row.decidable.includes(kind))]}
          reasons={deciding.reasons}
          signer={deciding.signer}
          sign={deciding.sign}
          onClose={() => setAsking(null)}
          onDone={(said) => {
            setAsking(null);
            toast(said);
            void query.refetch();
            onChanged();
          }}
        />
      ) : null}
    </>
  );
}

'use client';

import { usePathname, useRouter, useSearchParams } from 'next/navigation';
import { useMemo, useState } from 'react';
import { useToast } from '@/components/ui/toast';
import { mostBoardsAtOnce } from '@/lib/contracts/disposition';
import { rejectsPerPage, type RejectFilter, type RejectPage, type RejectRow } from '@/lib/contracts/reject-list';
import type { DispositionKind } from '@/lib/contracts/stored-states';
import { DataTable } from '../data-table';
import { DecisionButtons } from './decision-buttons';
import type { Deciding } from './deciding';
import { DispositionDialog } from './disposition-dialog';
import {
  endedColumn,
  lotColumn,
  measuredColumn,
  reasonColumn,
  rejectColumn,
  serialColumn,
  stationColumn,
  triesColumn,
} from './reject-columns';
import { SelectBox } from './select-box';

interface RejectListProps {
  rejects: RejectPage;
  filter: RejectFilter;
  deciding: Deciding;
}

/** Boards that wait for a decision, a page at a time; those chosen stay chosen from page to page. */
export function RejectList({ rejects, filter, deciding }: RejectListProps) {
  const toast = useToast();
  const router = useRouter();
  const path = usePathname();
  const query = useSearchParams();
  const [chosen, setChosen] = useState<ReadonlyMap<string, RejectRow>>(new Map());
  const [asking, setAsking] = useState<DispositionKind | null>(null);
  const { rows, total, page } = rejects;
  const selectable = deciding.kinds.length > 0;

  const columns = useMemo(() => {
    const choose = (some: readonly RejectRow[], on: boolean) =>
      setChosen((old) => {
        const next = new Map(old);
        for (const row of some) {
          if (on) next.set(row.unitId, row);
          else next.delete(row.unitId);
        }
        return next;
      });
    const here = rows.filter(({ unitId }) => chosen.has(unitId)).length;
    const box = rejectColumn.display({
      id: 'chosen',
      header: () => (
        <SelectBox
          label="All boards of this page"
          checked={here === rows.length}
          mixed={here > 0 && here < rows.length}
          onChange={(on) => choose(rows, on)}
        />
      ),
      cell: ({ row: { original } }) => (
        <SelectBox
          label={`Board ${original.serial}`}
          checked={chosen.has(original.unitId)}
          onChange={(on) => choose([original], on)}
        />
      ),
    });
    return rejectColumn.columns([
      ...(selectable ? [box] : []),
      serialColumn,
      lotColumn,
      reasonColumn,
      measuredColumn,
      triesColumn,
      stationColumn,
      endedColumn,
    ]);
  }, [chosen, rows, selectable]);

  function show(parts: Record<string, string | number>): void {
    const next = new URLSearchParams(query);
    for (const [name, value] of Object.entries(parts)) next.set(name, String(value));
    router.push(`${path}?${next}`);
  }

  const boards = [...chosen.values()];
  const kinds = deciding.kinds.filter((kind) => boards.every(({ decidable }) => decidable.includes(kind)));
  const words = boards.length === 1 ? '1 board' : `${boards.length} boards`;
  return (
    <>
      {selectable && rows.length > 0 ? (
        <div
          role="region"
          aria-label="Chosen boards"
          className="sticky top-0 z-10 mb-3 flex min-h-11 flex-wrap items-center gap-x-5 gap-y-2 bg-paper py-1.5"
        >
          {boards.length === 0 ? (
            <span className="text-ink-2">Choose boards to decide about them together.</span>
          ) : (
            <>
              <b aria-live="polite">{words} chosen</b>
              {boards.length > mostBoardsAtOnce ? (
                <span>At most {mostBoardsAtOnce} are decided at once.</span>
              ) : kinds.length === 0 ? (
                <span>Nothing can be decided about all of them by you. Choose fewer.</span>
              ) : (
                <DecisionButtons kinds={kinds} of={words} onChoose={setAsking} />
              )}
              <button type="button" className="sw-link" onClick={() => setChosen(new Map())}>
                Choose none
              </button>
            </>
          )}
        </div>
      ) : null}
      <DataTable
        rows={rows}
        columns={columns}
        rowKey={(row) => row.unitId}
        label="Boards that wait for a decision"
        empty={{ title: 'No board waits here.', text: 'A reject appears until somebody signs what is done with it.' }}
        pageSize={rejectsPerPage}
        served={{
          sorting: [{ id: filter.sort, desc: filter.order === 'falling' }],
          pageIndex: page - 1,
          rowCount: total,
          onSort: ({ id, desc }) => show({ sort: id, order: desc ? 'falling' : 'rising', page: 1 }),
          onPage: (pageIndex) => show({ page: pageIndex + 1 }),
        }}
      />
      {asking ? (
        <DispositionDialog
          boards={boards}
          kinds={[asking, ...kinds.filter((kind) => kind !== asking)]}
          reasons={deciding.reasons}
          signer={deciding.signer}
          sign={deciding.sign}
          onClose={() => setAsking(null)}
          onDone={(said) => {
            setAsking(null);
            setChosen(new Map());
            toast(said);
          }}
        />
      ) : null}
    </>
  );
}

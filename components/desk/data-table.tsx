'use client';

import {
  createColumnHelper,
  createPaginatedRowModel,
  createSortedRowModel,
  metaHelper,
  rowPaginationFeature,
  rowSortingFeature,
  sortFn_alphanumeric,
  sortFn_text,
  tableFeatures,
  useTable,
  type ColumnDef,
  type PaginationState,
  type RowData,
  type SortingState,
} from '@tanstack/react-table';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Table, Td, Th } from '@/components/ui/table';
import { count } from './numbers';

const features = tableFeatures({
  rowSortingFeature,
  rowPaginationFeature,
  sortedRowModel: createSortedRowModel(),
  paginatedRowModel: createPaginatedRowModel(),
  sortFns: { alphanumeric: sortFn_alphanumeric, text: sortFn_text },
  columnMeta: metaHelper<{ number?: boolean }>(),
});

/** Columns of a desk table; `meta.number` sets a column in Mono at the right. */
export const deskColumns = <Row extends RowData>() => createColumnHelper<typeof features, Row>();

interface DataTableProps<Row extends RowData> {
  rows: readonly Row[];
  // The values of the columns differ; each cell knows its own.
  columns: readonly ColumnDef<typeof features, Row, any>[]; // eslint-disable-line @typescript-eslint/no-explicit-any
  rowKey: (row: Row) => string;
  /** Read aloud before the table. */
  label: string;
  /** Said when there is no row. */
  empty: { title: string; text?: string };
  initialSort?: SortingState;
  pageSize?: number;
  /** Key of the row that the page shows more of. */
  chosen?: string | null;
  /** Rows come sorted and a page at a time from the server. */
  served?: ServedPage;
}

export interface ServedPage {
  sorting: SortingState;
  pageIndex: number;
  /** Rows on all pages. */
  rowCount: number;
  onSort: (by: SortingState[number]) => void;
  onPage: (pageIndex: number) => void;
}

/** A table that sorts by its heads, in the client or at the server; rows stack on a phone. */
export function DataTable<Row extends RowData>({
  rows,
  columns,
  rowKey,
  label,
  empty,
  initialSort = [],
  pageSize = 50,
  chosen = null,
  served,
}: DataTableProps<Row>) {
  const table = useTable({
    features,
    columns: columns as ColumnDef<typeof features, Row>[],
    data: rows as Row[],
    getRowId: rowKey,
    initialState: { sorting: initialSort, pagination: { pageIndex: 0, pageSize } },
    // Live data must not throw the reader back to the first page.
    autoResetPageIndex: false,
    ...(served && servedOptions(served, pageSize)),
  });
  if (rows.length === 0) return <EmptyState title={empty.title}>{empty.text}</EmptyState>;
  const { pageIndex } = table.state.pagination;
  const pages = table.getPageCount();
  const total = served?.rowCount ?? rows.length;
  return (
    <>
      <Table aria-label={label} className="sm:[&_:is(td,th):not(:last-child)]:pr-7">
        <thead>
          {table.getHeaderGroups().map((group) => (
            <tr key={group.id}>
              {group.headers.map((header) => {
                const sorted = header.column.getCanSort() ? header.column.getIsSorted() : false;
                return (
                  <Th
                    key={header.id}
                    number={header.column.columnDef.meta?.number}
                    aria-sort={sorted ? (sorted === 'asc' ? 'ascending' : 'descending') : undefined}
                  >
                    {header.column.getCanSort() ? (
                      <button
                        type="button"
                        className="min-h-[25px] font-text hover:text-accent"
                        onClick={header.column.getToggleSortingHandler()}
                      >
                        <table.FlexRender header={header} />
                        <SortMark sorted={sorted} />
                      </button>
                    ) : (
                      <table.FlexRender header={header} />
                    )}
                  </Th>
                );
              })}
            </tr>
          ))}
        </thead>
        <tbody>
          {table.getRowModel().rows.map((row) => (
            <tr key={row.id} data-chosen={row.id === chosen || undefined}>
              {row.getAllCells().map((cell) => {
                const { header, meta } = cell.column.columnDef;
                return (
                  <Td key={cell.id} number={meta?.number} label={typeof header === 'string' ? header : undefined}>
                    <table.FlexRender cell={cell} />
                  </Td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </Table>
      {pages > 1 ? (
        <nav aria-label={`Pages of ${label}`} className="mt-3 flex flex-wrap items-center gap-4">
          <Button unavailable={table.getCanPreviousPage() ? null : 'first page'} onClick={() => table.previousPage()}>
            Back
          </Button>
          <span>
            Rows <b>{count(pageIndex * pageSize + 1)}</b> to <b>{count(Math.min((pageIndex + 1) * pageSize, total))}</b>{' '}
            of <b>{count(total)}</b>
          </span>
          <Button unavailable={table.getCanNextPage() ? null : 'last page'} onClick={() => table.nextPage()}>
            More
          </Button>
        </nav>
      ) : null}
    </>
  );
}

function servedOptions({ sorting, pageIndex, rowCount, onSort, onPage }: ServedPage, pageSize: number) {
  const next = <T,>(updater: T | ((old: T) => T), old: T) =>
    typeof updater === 'function' ? (updater as (old: T) => T)(old) : updater;
  return {
    manualSorting: true,
    manualPagination: true,
    enableSortingRemoval: false,
    rowCount,
    state: { sorting, pagination: { pageIndex, pageSize } },
    onSortingChange: (updater: SortingState | ((old: SortingState) => SortingState)) => {
      const [by] = next(updater, sorting);
      if (by) onSort(by);
    },
    onPaginationChange: (updater: PaginationState | ((old: PaginationState) => PaginationState)) =>
      onPage(next(updater, { pageIndex, pageSize }).pageIndex),
  };
}

function SortMark({ sorted }: { sorted: false | 'asc' | 'desc' }) {
  if (!sorted) return null;
  return (
    <svg viewBox="0 0 10 8" aria-hidden="true" className="ml-1.5 inline-block h-[7px] w-[9px] fill-ink">
      <path d={sorted === 'asc' ? 'M0 8H10L5 0Z' : 'M0 0H10L5 8Z'} />
    </svg>
  );
}

'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Section } from '@/components/ui/page-head';
import { Table, Td, Th } from '@/components/ui/table';
import { useToast } from '@/components/ui/toast';
import type { Outcome } from '@/lib/contracts/outcome';
import type { ReasonCodeRow } from '@/lib/contracts/reason-code';
import { reasonCodeUses } from '@/lib/contracts/stored-states';
import { Time } from '../time';
import { AddReasonForm } from './add-reason-form';
import { MergeReasonDialog } from './merge-reason-dialog';
import { reasonUseWords } from './reason-use-words';

interface ReasonCodesProps {
  rows: readonly ReasonCodeRow[];
  actions: Record<'add' | 'retire' | 'merge', (input: unknown) => Promise<Outcome>>;
}

/** Reasons by what they are for: add, retire and bring back, merge. */
export function ReasonCodes({ rows, actions }: ReasonCodesProps) {
  const toast = useToast();
  const [merging, setMerging] = useState<ReasonCodeRow | null>(null);

  async function retire(row: ReasonCodeRow, retired: boolean): Promise<void> {
    const { id, word } = row;
    const outcome = await actions.retire({ id, retired }).catch(() => null);
    if (!outcome?.ok) toast(outcome?.sentence ?? 'The server did not answer. Nothing was changed. Try again.');
    else if (retired) toast(`“${word}” is offered no more`, () => void retire(row, false));
    else toast(`“${word}” is offered again`);
  }

  return (
    <>
      <AddReasonForm add={actions.add} />
      {reasonCodeUses.map((use) => {
        const kept = rows.filter((row) => row.use === use);
        return (
          <Section key={use} title={reasonUseWords[use]}>
            {kept.length === 0 ? (
              <EmptyState title="No reason is kept.">People give it in words.</EmptyState>
            ) : (
              <Table aria-label={reasonUseWords[use]}>
                <thead>
                  <tr>
                    <Th>Reason</Th>
                    <Th number>Named</Th>
                    <Th>Added</Th>
                    <Th>Now</Th>
                    <Th>
                      <span className="sr-only">Changes</span>
                    </Th>
                  </tr>
                </thead>
                <tbody>
                  {kept.map((row) => (
                    <tr key={row.id}>
                      <Td label="Reason" className={row.retiredIso ? 'text-ink-2' : 'font-bold'}>
                        {row.word}
                      </Td>
                      <Td label="Named" number>
                        {row.used}
                      </Td>
                      <Td label="Added">
                        <span>
                          {row.createdByName}, <Time iso={row.createdIso} format="day" />
                        </span>
                      </Td>
                      <Td label="Now">
                        <Now row={row} />
                      </Td>
                      <Td label="Changes">
                        <Changes
                          row={row}
                          mergeable={kept.some((other) => other.id !== row.id && !other.retiredIso)}
                          onRetire={(retired) => void retire(row, retired)}
                          onMerge={() => setMerging(row)}
                        />
                      </Td>
                    </tr>
                  ))}
                </tbody>
              </Table>
            )}
          </Section>
        );
      })}
      {merging ? (
        <MergeReasonDialog
          row={merging}
          others={rows.filter((row) => row.use === merging.use && row.id !== merging.id && !row.retiredIso)}
          merge={actions.merge}
          onClose={() => setMerging(null)}
          onDone={(said) => {
            setMerging(null);
            toast(said);
          }}
        />
      ) : null}
    </>
  );
}

function Now({ row: { retiredIso, mergedInto } }: { row: ReasonCodeRow }) {
  if (!retiredIso) return 'offered';
  return (
    <span className="text-ink-2">
      {mergedInto ? `counts as “${mergedInto}”` : 'not offered'} since <Time iso={retiredIso} format="day" />
    </span>
  );
}

interface ChangesProps {
  row: ReasonCodeRow;
  mergeable: boolean;
  onRetire: (retired: boolean) => void;
  onMerge: () => void;
}

function Changes({ row, mergeable, onRetire, onMerge }: ChangesProps) {
  if (row.mergedInto) return null;
  const { word, retiredIso } = row;
  return (
    <span className="flex flex-wrap justify-end gap-x-4">
      <Button
        kind="link"
        aria-label={`${retiredIso ? 'Bring back' : 'Retire'} ${word}`}
        onClick={() => onRetire(!retiredIso)}
      >
        {retiredIso ? 'Bring back' : 'Retire'}
      </Button>
      {mergeable ? (
        <Button kind="link" aria-label={`Merge ${word}`} onClick={onMerge}>
          Merge
        </Button>
      ) : null}
    </span>
  );
}

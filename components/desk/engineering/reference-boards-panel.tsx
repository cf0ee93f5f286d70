'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { Button } from '@/components/ui/button';
import { CheckField } from '@/components/ui/check-field';
import { Dialog } from '@/components/ui/dialog';
import { Section } from '@/components/ui/page-head';
import { PointMark } from '@/components/ui/point-mark';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { useToast } from '@/components/ui/toast';
import {
  changeReferenceBoardSchema,
  referenceBoardSchema,
  type ChangeReferenceBoardForm,
  type ReferenceBoardForm,
} from '@/lib/contracts/daily-check';
import { DataTable, deskColumns } from '../data-table';
import { FormProblem } from '../form-problem';
import { useActionForm } from '../use-action-form';
import type { Send } from './instrument-forms';

export interface ReferenceBoardRow {
  id: string;
  code: string;
  boardTypeCode: string;
  tripVolts: number;
  releaseVolts: number;
  toleranceVolts: number;
  retired: boolean;
}

interface PanelProps {
  boards: ReferenceBoardRow[];
  boardTypes: { id: string; code: string }[];
  /** Null: this person may look only. */
  actions: { add: Send; change: Send } | null;
}

const helper = deskColumns<ReferenceBoardRow & { onChange: (() => void) | null }>();
const fixed = (value: number) => `${value.toFixed(3)} V`;
const columns = helper.columns([
  helper.accessor('code', {
    header: 'Reference board',
    sortFn: 'alphanumeric',
    cell: ({ getValue }) => <b className="font-num">{getValue()}</b>,
  }),
  helper.accessor('boardTypeCode', { header: 'Board type', sortFn: 'text' }),
  helper.accessor('tripVolts', {
    header: 'Trip',
    meta: { number: true },
    cell: ({ getValue }) => (
      <span className="inline-flex items-center gap-1.5 text-trip">
        <PointMark point="trip" /> {fixed(getValue())}
      </span>
    ),
  }),
  helper.accessor('releaseVolts', {
    header: 'Release',
    meta: { number: true },
    cell: ({ getValue }) => (
      <span className="inline-flex items-center gap-1.5 text-release">
        <PointMark point="release" /> {fixed(getValue())}
      </span>
    ),
  }),
  helper.accessor('toleranceVolts', {
    header: 'Daily check may differ by',
    meta: { number: true },
    cell: ({ getValue }) => fixed(getValue()),
  }),
  helper.accessor((row) => (row.retired ? 'no longer in use' : 'in use'), {
    id: 'state',
    header: 'State',
    sortFn: 'text',
  }),
  helper.display({
    id: 'change',
    header: '',
    cell: ({ row: { original } }) =>
      original.onChange ? (
        <button type="button" className="sw-link" onClick={original.onChange}>
          Change the limits
        </button>
      ) : null,
  }),
]);

/** Boards of known points; their tolerance is the limit of the daily check. */
export function ReferenceBoardsPanel({ boards, boardTypes, actions }: PanelProps) {
  const [changing, setChanging] = useState<string | null>(null);
  const changed = boards.find((board) => board.id === changing);
  return (
    <>
      <DataTable
        rows={boards.map((board) => ({ ...board, onChange: actions ? () => setChanging(board.id) : null }))}
        columns={columns}
        rowKey={(row) => row.id}
        label="Reference boards"
        empty={{
          title: 'No reference board is recorded.',
          text: 'Daily checks and commissioning need one of each board type.',
        }}
      />
      {actions && boardTypes.length > 0 ? (
        <Section title="Add a reference board">
          <AddReferenceBoard boardTypes={boardTypes} add={actions.add} />
        </Section>
      ) : null}
      {changed && actions ? (
        <ChangeReferenceBoard board={changed} change={actions.change} onClose={() => setChanging(null)} />
      ) : null}
    </>
  );
}

type Entered = z.input<typeof referenceBoardSchema>;

function AddReferenceBoard({ boardTypes, add }: { boardTypes: { id: string; code: string }[]; add: Send }) {
  const toast = useToast();
  const defaults = {
    code: '',
    boardTypeId: boardTypes[0]!.id,
    tripVolts: '',
    releaseVolts: '',
    toleranceVolts: '0.02',
  };
  const form = useForm<Entered, unknown, ReferenceBoardForm>({
    resolver: zodResolver(referenceBoardSchema),
    defaultValues: defaults,
  });
  const { send, problem, sending } = useActionForm(form, add, () => {
    toast(`Reference board ${form.getValues('code').toUpperCase()} added`);
    form.reset(defaults);
  });
  const { errors } = form.formState;
  return (
    <form onSubmit={send} noValidate className="grid items-start gap-4 sm:grid-cols-[1.3fr_1fr_1fr_1fr_1fr_auto]">
      <TextField {...form.register('code')} label="Code" mono autoComplete="off" error={errors.code?.message} />
      <SelectField
        {...form.register('boardTypeId')}
        label="Board type"
        choices={boardTypes.map(({ id, code }) => ({ value: id, label: code }))}
        error={errors.boardTypeId?.message}
      />
      <TextField
        {...form.register('tripVolts')}
        label="Trip point"
        unit="V"
        inputMode="decimal"
        error={errors.tripVolts?.message}
      />
      <TextField
        {...form.register('releaseVolts')}
        label="Release point"
        unit="V"
        inputMode="decimal"
        error={errors.releaseVolts?.message}
      />
      <TextField
        {...form.register('toleranceVolts')}
        label="May differ by"
        unit="V"
        inputMode="decimal"
        error={errors.toleranceVolts?.message}
      />
      <div className="sm:pt-[22px]">
        <Button type="submit" kind="filled" pending={sending ? 'Storing' : null}>
          Add
        </Button>
      </div>
      <FormProblem problem={problem} />
    </form>
  );
}

function ChangeReferenceBoard({
  board,
  change,
  onClose,
}: {
  board: ReferenceBoardRow;
  change: Send;
  onClose: () => void;
}) {
  const toast = useToast();
  const form = useForm<z.input<typeof changeReferenceBoardSchema>, unknown, ChangeReferenceBoardForm>({
    resolver: zodResolver(changeReferenceBoardSchema),
    defaultValues: {
      referenceBoardId: board.id,
      tripVolts: board.tripVolts,
      releaseVolts: board.releaseVolts,
      toleranceVolts: board.toleranceVolts,
      retired: board.retired,
    },
  });
  const { send, problem, sending } = useActionForm(form, change, () => {
    toast(`Reference board ${board.code} changed`);
    onClose();
  });
  const { errors } = form.formState;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Change the limits of ${board.code}?`}
      consequence="The next daily check is judged by them. Checks on record stay as they were judged."
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Storing' : null}>
            Change the limits
          </Button>
          <Button kind="link" onClick={onClose}>
            Leave them as they are
          </Button>
        </>
      }
    >
      <TextField
        {...form.register('tripVolts')}
        label="Trip point"
        unit="V"
        inputMode="decimal"
        error={errors.tripVolts?.message}
      />
      <TextField
        {...form.register('releaseVolts')}
        label="Release point"
        unit="V"
        inputMode="decimal"
        error={errors.releaseVolts?.message}
      />
      <TextField
        {...form.register('toleranceVolts')}
        label="May differ by"
        unit="V"
        inputMode="decimal"
        error={errors.toleranceVolts?.message}
      />
      <CheckField {...form.register('retired')} label="No longer in use" />
      <FormProblem problem={problem} />
    </Dialog>
  );
}

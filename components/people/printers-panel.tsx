'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { DataTable, deskColumns } from '@/components/desk/data-table';
import { FormProblem } from '@/components/desk/form-problem';
import { useActionForm } from '@/components/desk/use-action-form';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { TextField } from '@/components/ui/text-field';
import { useToast } from '@/components/ui/toast';
import type { Outcome } from '@/lib/contracts/outcome';
import { printerSchema, type PrinterForm } from '@/lib/contracts/printer';

interface PrinterRow {
  printerId: string;
  name: string;
  uri: string;
  stationCodes: string[];
  retiredIso: string | null;
}

interface PrintersPanelProps {
  rows: PrinterRow[];
  save: (input: unknown) => Promise<Outcome>;
  retire: (input: unknown) => Promise<Outcome>;
}

const helper = deskColumns<PrinterRow>();

/** Label printers: list, add, change the address, take out of use. */
export function PrintersPanel({ rows, save, retire }: PrintersPanelProps) {
  const toast = useToast();
  const [form, setForm] = useState<PrinterForm | null>(null);
  const [problem, setProblem] = useState<string | null>(null);

  async function takeOut(row: PrinterRow): Promise<void> {
    const outcome = await retire({ printerId: row.printerId }).catch(() => null);
    setProblem(outcome?.ok ? null : (outcome?.sentence ?? 'The server did not answer. Try again.'));
    if (outcome?.ok) toast(`${row.name} is out of use`);
  }

  const columns = helper.columns([
    helper.accessor('name', { header: 'Printer', sortFn: 'alphanumeric' }),
    helper.accessor('uri', {
      header: 'Address',
      sortFn: 'text',
      cell: ({ getValue }) => <span className="font-num">{getValue()}</span>,
    }),
    helper.accessor((row) => row.stationCodes.join(', '), {
      id: 'stations',
      header: 'Labels of',
      sortFn: 'text',
      cell: ({ getValue }) => getValue() || <span className="text-ink-3">–</span>,
    }),
    helper.display({
      id: 'change',
      header: 'Changes',
      cell: ({ row: { original } }) =>
        original.retiredIso ? (
          'out of use'
        ) : (
          <span className="flex flex-wrap gap-4">
            <Button
              kind="link"
              onClick={() => setForm({ printerId: original.printerId, name: original.name, uri: original.uri })}
            >
              Change…
            </Button>
            <Button kind="link" onClick={() => void takeOut(original)}>
              Take out of use
            </Button>
          </span>
        ),
    }),
  ]);

  return (
    <>
      <FormProblem problem={problem} />
      <DataTable
        rows={rows}
        columns={columns}
        rowKey={(row) => row.printerId}
        label="Printers"
        empty={{ title: 'There is no printer.', text: 'Labels wait until a station has one.' }}
      />
      <div className="mt-5">
        <Button kind="filled" onClick={() => setForm({ printerId: null, name: '', uri: 'ipp://' })}>
          Add a printer
        </Button>
      </div>
      {form ? (
        <PrinterDialog
          start={form}
          save={save}
          onClose={() => setForm(null)}
          onSaved={() => {
            setForm(null);
            toast('Printer saved');
          }}
        />
      ) : null}
    </>
  );
}

function PrinterDialog({
  start,
  save,
  onClose,
  onSaved,
}: {
  start: PrinterForm;
  save: (input: unknown) => Promise<Outcome>;
  onClose: () => void;
  onSaved: () => void;
}) {
  const form = useForm<PrinterForm>({ resolver: zodResolver(printerSchema), defaultValues: start });
  const { send, problem, sending } = useActionForm(form, save, onSaved);
  const { errors } = form.formState;
  const verb = start.printerId ? 'Save the printer' : 'Add the printer';
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={start.printerId ? `Change ${start.name}?` : 'Add a printer?'}
      consequence="It must take PDF by IPP, on labels of 40 by 20 mm."
      focus="first-field"
    >
      <form onSubmit={send} noValidate className="grid gap-4">
        <TextField {...form.register('name')} label="Name" autoComplete="off" error={errors.name?.message} />
        <TextField {...form.register('uri')} label="Address" mono autoComplete="off" error={errors.uri?.message} />
        <FormProblem problem={problem} />
        <div className="flex flex-wrap items-center gap-4">
          <Button type="submit" kind="filled" pending={sending ? 'Saving' : null}>
            {verb}
          </Button>
          <Button data-safe onClick={onClose}>
            Leave it as it is
          </Button>
        </div>
      </form>
    </Dialog>
  );
}

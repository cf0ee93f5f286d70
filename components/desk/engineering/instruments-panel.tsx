'use client';

import { useState } from 'react';
import { Section } from '@/components/ui/page-head';
import type { InstrumentKind } from '@/lib/contracts/stored-states';
import { DataTable, deskColumns } from '../data-table';
import { Time } from '../time';
import { DueDate } from './due-date';
import {
  AddInstrumentForm,
  CalibrationForm,
  ChangeInstrumentDialog,
  type InstrumentChoice,
  type Send,
} from './instrument-forms';
import { instrumentWords, needsCertificate } from './instrument-words';

export interface InstrumentTableRow {
  id: string;
  code: string;
  kind: InstrumentKind;
  stationId: string | null;
  stationCode: string | null;
  expectedIdentity: string | null;
  retired: boolean;
  calibratedOn: string | null;
  dueOn: string | null;
  certificateNumber: string | null;
}

export interface CertificateRow {
  id: string;
  instrumentCode: string;
  calibratedOn: string;
  dueOn: string;
  certificateNumber: string;
  enteredByName: string;
  enteredIso: string;
}

interface InstrumentsPanelProps {
  instruments: InstrumentTableRow[];
  certificates: CertificateRow[];
  stations: { id: string; code: string }[];
  /** Year-month-day of the server. */
  today: string;
  /** Null: this person may look only. */
  actions: { add: Send; change: Send; record: Send } | null;
}

interface TableRow extends InstrumentTableRow {
  today: string;
  onChange: (() => void) | null;
}

const helper = deskColumns<TableRow>();
const columns = helper.columns([
  helper.accessor('code', {
    header: 'Instrument',
    sortFn: 'alphanumeric',
    cell: ({ getValue }) => <b className="font-num">{getValue()}</b>,
  }),
  helper.accessor((row) => instrumentWords[row.kind], { id: 'kind', header: 'Kind', sortFn: 'text' }),
  helper.accessor((row) => row.stationCode ?? '', {
    id: 'station',
    header: 'Where',
    sortFn: 'alphanumeric',
    cell: ({ row: { original } }) =>
      original.retired ? 'no longer in use' : original.stationCode ? `station ${original.stationCode}` : 'in the store',
  }),
  helper.accessor((row) => row.dueOn ?? undefined, {
    id: 'due',
    header: 'Due',
    sortFn: 'text',
    sortUndefined: 'last',
    cell: ({ row: { original } }) =>
      original.retired || !needsCertificate(original.kind) ? (
        <span className="text-ink-2">not needed</span>
      ) : (
        <DueDate dueOn={original.dueOn} today={original.today} />
      ),
  }),
  helper.accessor((row) => row.certificateNumber ?? '', { id: 'certificate', header: 'Certificate', sortFn: 'text' }),
  helper.display({
    id: 'change',
    header: '',
    cell: ({ row: { original } }) =>
      original.onChange ? (
        <button type="button" className="sw-link" onClick={original.onChange}>
          Change
        </button>
      ) : null,
  }),
]);

const certificates = deskColumns<CertificateRow>();
const certificateColumns = certificates.columns([
  certificates.accessor('instrumentCode', {
    header: 'Instrument',
    sortFn: 'alphanumeric',
    cell: ({ getValue }) => <span className="font-num">{getValue()}</span>,
  }),
  certificates.accessor('calibratedOn', {
    header: 'Calibrated',
    sortFn: 'text',
    cell: ({ getValue }) => <Time iso={`${getValue()}T12:00:00Z`} format="day" />,
  }),
  certificates.accessor('dueOn', {
    header: 'Due',
    sortFn: 'text',
    cell: ({ getValue }) => <Time iso={`${getValue()}T12:00:00Z`} format="day" />,
  }),
  certificates.accessor('certificateNumber', { header: 'Certificate', sortFn: 'text' }),
  certificates.accessor('enteredByName', { header: 'Recorded by', sortFn: 'text' }),
  certificates.accessor('enteredIso', {
    header: 'Recorded',
    sortFn: 'text',
    cell: ({ getValue }) => <Time iso={getValue()} />,
  }),
]);

/** Instruments with their due dates, certificates, and the forms for both. */
export function InstrumentsPanel({ instruments, certificates: rows, stations, today, actions }: InstrumentsPanelProps) {
  const [changing, setChanging] = useState<string | null>(null);
  const changed = instruments.find((instrument) => instrument.id === changing);
  const calibrated: InstrumentChoice[] = instruments.filter((each) => !each.retired && needsCertificate(each.kind));
  return (
    <>
      <DataTable
        rows={instruments.map((instrument) => ({
          ...instrument,
          today,
          onChange: actions ? () => setChanging(instrument.id) : null,
        }))}
        columns={columns}
        rowKey={(row) => row.id}
        label="Instruments"
        empty={{
          title: 'No instrument is recorded.',
          text: 'A station needs a supply and a multimeter with certificates.',
        }}
      />
      {actions && calibrated.length > 0 ? (
        <Section title="Record a certificate">
          <CalibrationForm instruments={calibrated} record={actions.record} />
        </Section>
      ) : null}
      {actions ? (
        <Section title="Add an instrument">
          <AddInstrumentForm stations={stations} add={actions.add} />
        </Section>
      ) : null}
      <Section title="Certificates">
        <DataTable
          rows={rows}
          columns={certificateColumns}
          rowKey={(row) => row.id}
          label="Certificates"
          empty={{ title: 'No certificate is recorded.' }}
          pageSize={20}
        />
      </Section>
      {changed && actions ? (
        <ChangeInstrumentDialog
          instrument={changed}
          stations={stations}
          change={actions.change}
          onClose={() => setChanging(null)}
        />
      ) : null}
    </>
  );
}

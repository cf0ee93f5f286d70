'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Section } from '@/components/ui/page-head';
import { SelectField } from '@/components/ui/select-field';
import { Table, Td, Th } from '@/components/ui/table';
import { TextField } from '@/components/ui/text-field';
import { useToast } from '@/components/ui/toast';
import { VerdictMark } from '@/components/ui/verdict-mark';
import { trainingSchema, type TrainingForm as Form } from '@/lib/contracts/training';
import { FormProblem } from '../form-problem';
import { Time } from '../time';
import { useActionForm } from '../use-action-form';
import type { Send } from './instrument-forms';

export interface TrainedPerson {
  id: string;
  name: string;
  operatorNumber: string | null;
  /** End of the training by board type id. */
  until: Record<string, string>;
}

interface PanelProps {
  people: TrainedPerson[];
  boardTypes: { id: string; code: string }[];
  nowIso: string;
  /** Null: this person may look only. */
  record: Send | null;
}

const soonMs = 14 * 24 * 3_600_000;

/** Who is trained for which board type, and until when. */
export function TrainingPanel({ people, boardTypes, nowIso, record }: PanelProps) {
  if (people.length === 0)
    return (
      <EmptyState title="Nobody is an operator yet.">The administrator adds people under Administration.</EmptyState>
    );
  return (
    <>
      <Table aria-label="Training by person and board type">
        <thead>
          <tr>
            <Th>Operator</Th>
            <Th>Number</Th>
            {boardTypes.map((type) => (
              <Th key={type.id}>{type.code}</Th>
            ))}
          </tr>
        </thead>
        <tbody>
          {people.map((person) => (
            <tr key={person.id}>
              <Td label="Operator">
                <b>{person.name}</b>
              </Td>
              <Td label="Number" className="font-num">
                {person.operatorNumber ?? ''}
              </Td>
              {boardTypes.map((type) => (
                <Td key={type.id} label={type.code}>
                  <Until untilIso={person.until[type.id] ?? null} nowIso={nowIso} />
                </Td>
              ))}
            </tr>
          ))}
        </tbody>
      </Table>
      {record && boardTypes.length > 0 ? (
        <Section title="Record a training">
          <RecordTraining people={people} boardTypes={boardTypes} record={record} />
        </Section>
      ) : null}
    </>
  );
}

function Until({ untilIso, nowIso }: { untilIso: string | null; nowIso: string }) {
  if (!untilIso) return <span className="text-ink-3">not trained</span>;
  const left = Date.parse(untilIso) - Date.parse(nowIso);
  // The stored moment is the midnight after the last day.
  const shown = <Time iso={new Date(Date.parse(untilIso) - 1).toISOString()} format="day" />;
  if (left <= 0)
    return (
      <span className="inline-flex items-center gap-1.5 font-bold text-reject">
        <VerdictMark shape="reject" size={13} /> ended {shown}
      </span>
    );
  return (
    <span className="inline-flex items-center gap-1.5">
      {left < soonMs ? <VerdictMark shape="check" size={14} /> : null}
      until {shown}
    </span>
  );
}

function RecordTraining({ people, boardTypes, record }: Omit<PanelProps, 'nowIso' | 'record'> & { record: Send }) {
  const toast = useToast();
  const form = useForm<Form>({
    resolver: zodResolver(trainingSchema),
    defaultValues: { accountId: people[0]!.id, boardTypeId: boardTypes[0]!.id, validUntil: '' },
  });
  const { send, problem, sending } = useActionForm(form, record, () => {
    const person = people.find(({ id }) => id === form.getValues('accountId'));
    toast(`Training of ${person?.name ?? ''} recorded`);
  });
  const { errors } = form.formState;
  return (
    <form onSubmit={send} noValidate className="grid max-w-[860px] items-start gap-4 sm:grid-cols-[1.3fr_1fr_1fr_auto]">
      <SelectField
        {...form.register('accountId')}
        label="Operator"
        choices={people.map(({ id, name }) => ({ value: id, label: name }))}
        error={errors.accountId?.message}
      />
      <SelectField
        {...form.register('boardTypeId')}
        label="Board type"
        choices={boardTypes.map(({ id, code }) => ({ value: id, label: code }))}
        error={errors.boardTypeId?.message}
      />
      <TextField
        {...form.register('validUntil')}
        label="Valid until"
        type="date"
        hint="The last day."
        error={errors.validUntil?.message}
      />
      <div className="sm:pt-[22px]">
        <Button type="submit" kind="filled" pending={sending ? 'Storing' : null}>
          Record
        </Button>
      </div>
      <FormProblem problem={problem} />
    </form>
  );
}

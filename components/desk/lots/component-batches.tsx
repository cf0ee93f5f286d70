'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Table, Td, Th } from '@/components/ui/table';
import { TextField } from '@/components/ui/text-field';
import { useToast } from '@/components/ui/toast';
import { componentBatchSchema, type ComponentBatchForm } from '@/lib/contracts/lot';
import type { ComponentBatchRow } from '@/lib/contracts/lot-page';
import type { Outcome } from '@/lib/contracts/outcome';
import { FormProblem } from '../form-problem';
import { Time } from '../time';
import { useActionForm } from '../use-action-form';

interface ComponentBatchesProps {
  lotId: string;
  batches: readonly ComponentBatchRow[];
  /** Null: this person may not record batches here. */
  record: ((input: unknown) => Promise<Outcome>) | null;
  onChanged: () => void;
}

/** Which batch of each component the boards carry, from when on; changes made at a bench stand beside those of a desk. */
export function ComponentBatches({ lotId, batches, record, onChanged }: ComponentBatchesProps) {
  return (
    <>
      {batches.length === 0 ? (
        <EmptyState title="No batch is recorded.">
          A batch counts from its time on, until the next one of the same component.
        </EmptyState>
      ) : (
        <Table aria-label="Component batches">
          <thead>
            <tr>
              <Th>Component</Th>
              <Th>Batch</Th>
              <Th>From</Th>
              <Th>Recorded by</Th>
            </tr>
          </thead>
          <tbody>
            {batches.map((batch) => (
              <tr key={batch.id}>
                <Td label="Component">{batch.component}</Td>
                <Td label="Batch">
                  <b className="font-num">{batch.batch}</b>
                </Td>
                <Td label="From">
                  <Time iso={batch.fromIso} />
                </Td>
                <Td label="Recorded by">
                  {batch.byName}, {batch.stationCode ? `station ${batch.stationCode}` : 'at a desk'}
                </Td>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
      {record ? <BatchForm lotId={lotId} record={record} onChanged={onChanged} /> : null}
    </>
  );
}

function BatchForm({
  lotId,
  record,
  onChanged,
}: {
  lotId: string;
  record: (input: unknown) => Promise<Outcome>;
  onChanged: () => void;
}) {
  const toast = useToast();
  const form = useForm<ComponentBatchForm>({
    resolver: zodResolver(componentBatchSchema),
    defaultValues: { lotId, component: '', batch: '' },
  });
  const { send, problem, sending } = useActionForm(form, record, () => {
    toast(`Batch ${form.getValues('batch')} recorded`);
    form.reset({ lotId, component: '', batch: '' });
    onChanged();
  });
  const { errors } = form.formState;
  return (
    <form onSubmit={send} noValidate className="mt-4 grid items-start gap-4 sm:grid-cols-[1fr_1fr_auto]">
      <TextField
        {...form.register('component')}
        label="Component"
        autoComplete="off"
        error={errors.component?.message}
      />
      <TextField {...form.register('batch')} label="Batch" mono autoComplete="off" error={errors.batch?.message} />
      <div className="sm:pt-[22px]">
        <Button type="submit" pending={sending ? 'Storing' : null}>
          Record the batch
        </Button>
      </div>
      <FormProblem problem={problem} />
    </form>
  );
}

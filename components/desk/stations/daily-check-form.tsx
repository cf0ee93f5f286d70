'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { useToast } from '@/components/ui/toast';
import { dailyCheckSchema, type DailyCheckForm as Parsed } from '@/lib/contracts/daily-check';
import type { Send } from '../engineering/instrument-forms';
import { FormProblem } from '../form-problem';
import { useActionForm } from '../use-action-form';

interface DailyCheckFormProps {
  stationId: string;
  references: { id: string; code: string }[];
  validHours: number;
  record: Send<{ passed: boolean }>;
  onDone: () => void;
}

/** A check measured beside the station. The bench records its own when the reference board is scanned there. */
export function DailyCheckForm({ stationId, references, validHours, record, onDone }: DailyCheckFormProps) {
  const toast = useToast();
  const form = useForm<z.input<typeof dailyCheckSchema>, unknown, Parsed>({
    resolver: zodResolver(dailyCheckSchema),
    defaultValues: {
      stationId,
      referenceBoardId: references[0]?.id ?? '',
      tripVolts: '',
      releaseVolts: '',
      validHours,
    },
  });
  const { send, problem, sending } = useActionForm(form, record, ({ passed }) => {
    toast(passed ? 'The daily check passed' : 'The daily check failed. The station may not test.');
    form.reset({ ...form.getValues(), tripVolts: '', releaseVolts: '' });
    onDone();
  });
  const { errors } = form.formState;
  return (
    <form onSubmit={send} noValidate className="grid items-start gap-4 sm:grid-cols-[1.2fr_1fr_1fr_1fr_auto]">
      <SelectField
        {...form.register('referenceBoardId')}
        label="Reference board"
        choices={references.map(({ id, code }) => ({ value: id, label: code }))}
        error={errors.referenceBoardId?.message}
      />
      <TextField
        {...form.register('tripVolts')}
        label="Trip measured"
        unit="V"
        inputMode="decimal"
        autoComplete="off"
        error={errors.tripVolts?.message}
      />
      <TextField
        {...form.register('releaseVolts')}
        label="Release measured"
        unit="V"
        inputMode="decimal"
        autoComplete="off"
        error={errors.releaseVolts?.message}
      />
      <TextField
        {...form.register('validHours')}
        label="Valid for"
        unit="h"
        inputMode="decimal"
        error={errors.validHours?.message}
      />
      <div className="sm:pt-[22px]">
        <Button type="submit" pending={sending ? 'Storing' : null}>
          Enter the check
        </Button>
      </div>
      <FormProblem problem={problem} />
    </form>
  );
}

'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import type { z } from 'zod';
import { Button, ButtonLink } from '@/components/ui/button';
import { CheckField } from '@/components/ui/check-field';
import { ChoiceField } from '@/components/ui/choice-field';
import { LoadingTicks } from '@/components/ui/loading-ticks';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { useToast } from '@/components/ui/toast';
import { createLotSchema, type CreateLot } from '@/lib/contracts/lot';
import type { SerialRow } from '@/lib/contracts/lot-serials';
import type { Outcome } from '@/lib/contracts/outcome';
import { FileDrop } from '../file-drop';
import { FormProblem } from '../form-problem';
import { useActionForm } from '../use-action-form';
import { SerialPreview } from './serial-preview';

export interface LotFormBasis {
  sequenceRevisionId: string;
  sequenceName: string;
  sequenceNumber: number;
  boardTypeCode: string;
  boardTypeName: string;
}

interface LotFormProps {
  bases: LotFormBasis[];
  check: (input: unknown) => Promise<Outcome<SerialRow[]>>;
  create: (input: unknown) => Promise<Outcome<{ code: string; size: number }>>;
}

type Entered = z.input<typeof createLotSchema>;
type Kind = Entered['serials']['kind'];

/** A new lot. Its boards are shown before anything is stored, each bad one with its reason. */
export function LotForm({ bases, check, create }: LotFormProps) {
  const router = useRouter();
  const toast = useToast();
  const form = useForm<Entered, unknown, CreateLot>({
    resolver: zodResolver(createLotSchema),
    defaultValues: {
      code: '',
      sequenceRevisionId: bases[0]?.sequenceRevisionId ?? '',
      serials: { kind: 'counted', firstSerial: '', quantity: '' },
    },
  });
  const [file, setFile] = useState<{ name: string; text: string } | null>(null);
  const [rows, setRows] = useState<SerialRow[] | null>(null);
  const [checking, setChecking] = useState(false);
  // Both ways of naming the boards keep what was entered when the other one is looked at.
  const [counted, setCounted] = useState({ firstSerial: '', quantity: '' });
  const kind: Kind = useWatch({ control: form.control, name: 'serials.kind' });
  const chosen = useWatch({ control: form.control, name: 'sequenceRevisionId' });
  const { send, problem, sending } = useActionForm(form, create, ({ code, size }) => {
    toast(`Lot ${code} made with ${size} ${size === 1 ? 'board' : 'boards'}`);
    router.push(`/lots/${encodeURIComponent(code)}`);
  });
  const errors = form.formState.errors;
  const serialErrors = errors.serials as
    Partial<Record<'firstSerial' | 'quantity' | 'text', { message?: string }>> | undefined;

  async function look(entered: Entered): Promise<void> {
    setChecking(true);
    form.clearErrors('serials');
    const outcome = await check({ sequenceRevisionId: entered.sequenceRevisionId, serials: entered.serials }).catch(
      () => null,
    );
    setChecking(false);
    if (outcome?.ok) return setRows(outcome.value);
    setRows(null);
    const field = (outcome?.field ?? 'serials') as 'serials.text';
    form.setError(field, { message: outcome?.sentence ?? 'The server did not answer. Try again.' });
  }

  function choose(next: Kind): void {
    setRows(null);
    form.clearErrors('serials');
    if (next === 'listed') {
      const now = form.getValues('serials');
      if (now.kind === 'counted') setCounted({ firstSerial: now.firstSerial, quantity: String(now.quantity ?? '') });
      form.setValue('serials', { kind: 'listed', text: file?.text ?? '', leaveOutBad: false });
    } else form.setValue('serials', { kind: 'counted', ...counted });
    if (next === 'listed' && file) void look(form.getValues());
  }

  const bad = rows?.filter((row) => row.problem !== null).length ?? 0;
  return (
    <form onSubmit={send} noValidate className="grid max-w-[860px] gap-6">
      <div className="grid items-start gap-5 sm:grid-cols-2">
        <TextField
          {...form.register('code')}
          label="Lot number"
          mono
          autoFocus
          autoComplete="off"
          hint="Printed on the lot sheet, such as 2648-B."
          error={errors.code?.message}
        />
        <SelectField
          {...form.register('sequenceRevisionId', { onChange: () => rows && void look(form.getValues()) })}
          label="Board type and released sequence"
          choices={bases.map((basis) => ({
            value: basis.sequenceRevisionId,
            label: `${basis.boardTypeCode} r${basis.sequenceNumber}, ${basis.sequenceName}`,
          }))}
          hint={bases.find((basis) => basis.sequenceRevisionId === chosen)?.boardTypeName}
          error={errors.sequenceRevisionId?.message}
        />
      </div>
      <ChoiceField
        legend="Boards"
        choices={[
          { value: 'counted', label: 'Count up from the first serial number' },
          { value: 'listed', label: 'Take the serial numbers from a file' },
        ]}
        name="kind"
        defaultValue={kind}
        onChange={(event) => choose(event.target.value as Kind)}
      />
      {kind === 'counted' ? (
        <div className="grid items-start gap-5 sm:grid-cols-[2fr_1fr_auto]">
          <TextField
            {...form.register('serials.firstSerial')}
            label="First serial number"
            mono
            autoComplete="off"
            hint="Its last digits are counted up."
            error={serialErrors?.firstSerial?.message}
          />
          <TextField
            {...form.register('serials.quantity')}
            label="Quantity"
            inputMode="numeric"
            autoComplete="off"
            error={serialErrors?.quantity?.message}
          />
          <div className="sm:pt-[22px]">
            <Button onClick={() => void look(form.getValues())} pending={checking ? 'Checking' : null}>
              Check the boards
            </Button>
          </div>
        </div>
      ) : (
        <div className="grid gap-2">
          <FileDrop
            label="Choose a file"
            kinds="CSV or text with a serial number on each line, or a column headed “serial”; at most 500 kB"
            accept=".csv,.txt,text/csv,text/plain"
            mostBytes={500_000}
            chosen={file?.name ?? null}
            onText={(name, text) => {
              setFile({ name, text });
              form.setValue('serials', { kind: 'listed', text, leaveOutBad: false });
              void look(form.getValues());
            }}
          />
          <FormProblem problem={serialErrors?.text?.message ?? null} />
        </div>
      )}
      {checking ? <LoadingTicks label="Checking the serial numbers" /> : rows ? <SerialPreview rows={rows} /> : null}
      {kind === 'listed' && bad > 0 && bad < (rows?.length ?? 0) ? (
        <CheckField
          {...form.register('serials.leaveOutBad')}
          label={`Leave out the ${bad} that cannot be stored`}
          hint="Or correct the file and choose it again."
        />
      ) : null}
      <FormProblem problem={problem} />
      <div className="flex flex-wrap items-center gap-5">
        <Button type="submit" kind="filled" pending={sending ? 'Making the lot' : null}>
          Make the lot
        </Button>
        <ButtonLink kind="link" href="/lots">
          Back to the lots
        </ButtonLink>
      </div>
    </form>
  );
}

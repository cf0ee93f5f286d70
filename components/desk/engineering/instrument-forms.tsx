'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Button } from '@/components/ui/button';
import { CheckField } from '@/components/ui/check-field';
import { Dialog } from '@/components/ui/dialog';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { useToast } from '@/components/ui/toast';
import {
  calibrationSchema,
  changeInstrumentSchema,
  instrumentSchema,
  type CalibrationForm as Calibration,
  type ChangeInstrumentForm,
  type InstrumentForm as Instrument,
} from '@/lib/contracts/calibration';
import type { Outcome } from '@/lib/contracts/outcome';
import { instrumentKinds, type InstrumentKind } from '@/lib/contracts/stored-states';
import { FormProblem } from '../form-problem';
import { useActionForm } from '../use-action-form';
import { instrumentWords } from './instrument-words';

export type Send<T = null> = (input: unknown) => Promise<Outcome<T>>;

export interface InstrumentChoice {
  id: string;
  code: string;
  kind: InstrumentKind;
  stationId: string | null;
  expectedIdentity: string | null;
}
interface Station {
  id: string;
  code: string;
}

const places = (stations: readonly Station[]) => [
  { value: '', label: 'in the store' },
  ...stations.map(({ id, code }) => ({ value: id, label: `station ${code}` })),
];

/** Records a certificate: the newest decides whether the station may test. */
export function CalibrationForm({ instruments, record }: { instruments: readonly InstrumentChoice[]; record: Send }) {
  const toast = useToast();
  const form = useForm<Calibration>({
    resolver: zodResolver(calibrationSchema),
    defaultValues: { instrumentId: instruments[0]?.id ?? '', calibratedOn: '', dueOn: '', certificateNumber: '' },
  });
  const { send, problem, sending } = useActionForm(form, record, () => {
    const code = instruments.find(({ id }) => id === form.getValues('instrumentId'))?.code ?? '';
    toast(`Certificate of ${code} recorded`);
    form.reset({ instrumentId: form.getValues('instrumentId'), calibratedOn: '', dueOn: '', certificateNumber: '' });
  });
  const { errors } = form.formState;
  return (
    <form onSubmit={send} noValidate className="grid items-start gap-4 sm:grid-cols-[1fr_1fr_1fr_1.4fr_auto]">
      <SelectField
        {...form.register('instrumentId')}
        label="Instrument"
        choices={instruments.map(({ id, code }) => ({ value: id, label: code }))}
        error={errors.instrumentId?.message}
      />
      <TextField
        {...form.register('calibratedOn')}
        label="Calibrated on"
        type="date"
        error={errors.calibratedOn?.message}
      />
      <TextField
        {...form.register('dueOn')}
        label="Due on"
        type="date"
        hint="The last day of use."
        error={errors.dueOn?.message}
      />
      <TextField
        {...form.register('certificateNumber')}
        label="Certificate number"
        autoComplete="off"
        error={errors.certificateNumber?.message}
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

export function AddInstrumentForm({ stations, add }: { stations: readonly Station[]; add: Send }) {
  const toast = useToast();
  const form = useForm<Instrument>({
    resolver: zodResolver(instrumentSchema),
    defaultValues: { code: '', kind: 'multimeter', stationId: '', expectedIdentity: '' },
  });
  const { send, problem, sending } = useActionForm(form, add, () => {
    toast(`Instrument ${form.getValues('code').toUpperCase()} added`);
    form.reset();
  });
  const { errors } = form.formState;
  return (
    <form onSubmit={send} noValidate className="grid items-start gap-4 sm:grid-cols-[1fr_1fr_1fr_2fr_auto]">
      <TextField
        {...form.register('code')}
        label="Code on its sticker"
        mono
        autoComplete="off"
        error={errors.code?.message}
      />
      <SelectField
        {...form.register('kind')}
        label="Kind"
        choices={instrumentKinds.map((kind) => ({ value: kind, label: instrumentWords[kind] }))}
        error={errors.kind?.message}
      />
      <SelectField
        {...form.register('stationId')}
        label="Where"
        choices={places(stations)}
        error={errors.stationId?.message}
      />
      <TextField
        {...form.register('expectedIdentity')}
        label="Its answer to *IDN?"
        mono
        autoComplete="off"
        hint="Empty: any answer is taken."
        error={errors.expectedIdentity?.message}
      />
      <div className="sm:pt-[22px]">
        <Button type="submit" pending={sending ? 'Storing' : null}>
          Add
        </Button>
      </div>
      <FormProblem problem={problem} />
    </form>
  );
}

interface ChangeInstrumentProps {
  instrument: InstrumentChoice & { retired: boolean };
  stations: readonly Station[];
  change: Send;
  onClose: () => void;
}

/** Where it stands, how it answers, whether it is in use. */
export function ChangeInstrumentDialog({ instrument, stations, change, onClose }: ChangeInstrumentProps) {
  const toast = useToast();
  const form = useForm<ChangeInstrumentForm>({
    resolver: zodResolver(changeInstrumentSchema),
    defaultValues: {
      instrumentId: instrument.id,
      stationId: instrument.stationId ?? '',
      expectedIdentity: instrument.expectedIdentity ?? '',
      retired: instrument.retired,
    },
  });
  const { send, problem, sending } = useActionForm(form, change, () => {
    toast(`Instrument ${instrument.code} changed`);
    onClose();
  });
  const { errors } = form.formState;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Change ${instrument.code}?`}
      consequence="Its station takes the change when it opens its instruments again."
      focus="first-field"
      actions={
        <>
          <Button kind="filled" onClick={() => void send()} pending={sending ? 'Storing' : null}>
            Change it
          </Button>
          <Button kind="link" onClick={onClose}>
            Leave it as it is
          </Button>
        </>
      }
    >
      <SelectField
        {...form.register('stationId')}
        label="Where"
        choices={places(stations)}
        error={errors.stationId?.message}
      />
      <TextField
        {...form.register('expectedIdentity')}
        label="Its answer to *IDN?"
        mono
        autoComplete="off"
        hint="Empty: any answer is taken."
        error={errors.expectedIdentity?.message}
      />
      <CheckField {...form.register('retired')} label="No longer in use" />
      <FormProblem problem={problem} />
    </Dialog>
  );
}

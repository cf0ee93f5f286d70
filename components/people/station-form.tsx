'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useRouter } from 'next/navigation';
import { useForm, useWatch } from 'react-hook-form';
import { FormProblem } from '@/components/desk/form-problem';
import { useActionForm } from '@/components/desk/use-action-form';
import { Button, ButtonLink } from '@/components/ui/button';
import { CheckField } from '@/components/ui/check-field';
import { ChoiceField } from '@/components/ui/choice-field';
import { Section } from '@/components/ui/page-head';
import { SelectField, type Choice } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { useToast } from '@/components/ui/toast';
import type { Outcome } from '@/lib/contracts/outcome';
import { baudRates } from '@/lib/contracts/station-link';
import { stationSchema, type StationForm, type StationSettings } from '@/lib/contracts/station-settings';

interface StationFormProps {
  /** Of a new station the code is free. */
  isNew: boolean;
  start: StationForm;
  printers: Choice[];
  save: (input: unknown) => Promise<Outcome>;
}

/** A station: where it stands, how its instruments are reached, what its screen looks like. */
export function StationSettingsForm({ isNew, start, printers, save }: StationFormProps) {
  const router = useRouter();
  const toast = useToast();
  const form = useForm<StationForm, unknown, StationSettings>({
    resolver: zodResolver(stationSchema),
    defaultValues: start,
  });
  // The action parses the form itself: what it gets is what was entered.
  const { send, problem, sending } = useActionForm(
    form,
    () => save(form.getValues()),
    () => {
      toast(isNew ? 'Station added' : 'Station saved. Its bench opens the instruments anew between boards.');
      router.push('/administration/stations');
    },
  );
  const { errors } = form.formState;
  const linkKind = useWatch({ control: form.control, name: 'linkKind' });
  return (
    <form onSubmit={send} noValidate className="max-w-[720px]">
      <div className="grid gap-5">
        <div className="grid gap-5 sm:grid-cols-[1fr_2fr]">
          <TextField
            {...form.register('code')}
            label="Code"
            mono
            readOnly={!isNew}
            autoComplete="off"
            hint={isNew ? 'Printed on the bin, such as S4. It stays.' : 'Stays as it was given.'}
            error={errors.code?.message}
          />
          <TextField {...form.register('name')} label="Name" autoComplete="off" error={errors.name?.message} />
        </div>
        <TextField
          {...form.register('fixture')}
          label="Fixture on it"
          autoComplete="off"
          error={errors.fixture?.message}
        />
        <CheckField {...form.register('hasWiperProbe')} label="The fixture has a probe on the trimmer’s wiper" />
      </div>
      <Section title="Instruments">
        <div className="grid gap-5">
          <ChoiceField
            {...form.register('linkKind')}
            legend="How they are reached"
            choices={[
              { value: 'serial', label: 'Serial ports' },
              { value: 'simulated', label: 'Simulated, for demo and training' },
            ]}
          />
          {linkKind === 'serial' ? (
            <>
              <TextField
                {...form.register('supplyPath')}
                label="Port of the supply"
                mono
                autoComplete="off"
                hint="Names below /dev/serial/by-id stay the same when cables are moved."
                error={errors.supplyPath?.message}
              />
              <TextField
                {...form.register('meterPath')}
                label="Port of the multimeter"
                mono
                autoComplete="off"
                error={errors.meterPath?.message}
              />
              <TextField
                {...form.register('controllerPath')}
                label="Port of the fixture controller"
                mono
                autoComplete="off"
                hint="Leave it empty without one: the operator then confirms lid and board, and ride-through is not tested."
                error={errors.controllerPath?.message}
              />
            </>
          ) : (
            <>
              <CheckField {...form.register('hasController')} label="With a fixture controller" />
              <TextField
                {...form.register('seed')}
                label="Seed"
                inputMode="numeric"
                autoComplete="off"
                hint="The same seed gives the same offsets and noise."
                error={errors.seed?.message}
              />
            </>
          )}
          <div className="grid gap-5 sm:grid-cols-2">
            <SelectField
              {...form.register('baudRate')}
              label="Baud rate"
              choices={baudRates.map((rate) => ({ value: String(rate), label: String(rate) }))}
              error={errors.baudRate?.message}
            />
            <SelectField
              {...form.register('mainsHz')}
              label="Mains frequency"
              choices={[
                { value: '50', label: '50 Hz' },
                { value: '60', label: '60 Hz' },
              ]}
            />
          </div>
        </div>
      </Section>
      <Section title="Screen and labels">
        <div className="grid gap-5 sm:grid-cols-2">
          <SelectField
            {...form.register('scheme')}
            label="Screen"
            choices={[
              { value: 'system', label: 'As its system says' },
              { value: 'day', label: 'Day bench' },
              { value: 'night', label: 'Night bench' },
            ]}
          />
          <SelectField
            {...form.register('printerId')}
            label="Label printer"
            choices={[{ value: '', label: 'None: labels wait' }, ...printers]}
          />
        </div>
      </Section>
      <div className="mt-7 grid gap-4">
        <FormProblem problem={problem} />
        <div className="flex flex-wrap items-center gap-5">
          <Button type="submit" kind="filled" pending={sending ? 'Saving' : null}>
            {isNew ? 'Add the station' : 'Save the station'}
          </Button>
          <ButtonLink kind="link" href="/administration/stations">
            Back to the stations
          </ButtonLink>
        </div>
      </div>
    </form>
  );
}

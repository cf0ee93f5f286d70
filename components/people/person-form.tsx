'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useRouter } from 'next/navigation';
import { useForm } from 'react-hook-form';
import { FormProblem } from '@/components/desk/form-problem';
import { useActionForm } from '@/components/desk/use-action-form';
import { Button, ButtonLink } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { useToast } from '@/components/ui/toast';
import {
  addPersonSchema,
  changePersonSchema,
  type AddPerson,
  type AddPersonForm,
  type ChangePerson,
  type ChangePersonForm,
} from '@/lib/contracts/people';
import type { Outcome } from '@/lib/contracts/outcome';
import { RoleFields } from './role-fields';

export interface LocaleChoice {
  value: string;
  label: string;
}

const list = (accountId: string) => `/administration/people?who=${accountId}`;

/** A new person. Password and PIN come after, from the page of the person. */
export function AddPersonForm({
  locales,
  add,
}: {
  locales: LocaleChoice[];
  add: (input: unknown) => Promise<Outcome<{ accountId: string }>>;
}) {
  const router = useRouter();
  const toast = useToast();
  const form = useForm<AddPersonForm, unknown, AddPerson>({
    resolver: zodResolver(addPersonSchema),
    defaultValues: { name: '', email: '', operatorNumber: '', badgeNumber: '', roles: ['operator'], locale: 'en' },
  });
  const { send, problem, sending } = useActionForm(form, add, ({ accountId }) => {
    toast('Person added. Give them a PIN or a link to choose a password.');
    router.push(list(accountId));
  });
  const { errors } = form.formState;
  return (
    <form onSubmit={send} noValidate className="grid max-w-[620px] gap-5">
      <TextField {...form.register('name')} label="Name" autoFocus autoComplete="off" error={errors.name?.message} />
      <RoleFields register={form.register} error={errors.roles?.message} />
      <TextField
        {...form.register('email')}
        label="E-mail"
        type="email"
        autoComplete="off"
        hint="Signs in with it at a desk. Leave it empty for benches only."
        error={errors.email?.message}
      />
      <div className="grid gap-5 sm:grid-cols-2">
        <TextField
          {...form.register('operatorNumber')}
          label="Number at the bench"
          mono
          autoComplete="off"
          hint="Shown on bench screens, such as 14."
          error={errors.operatorNumber?.message}
        />
        <TextField
          {...form.register('badgeNumber')}
          label="Badge number"
          mono
          autoComplete="off"
          hint="Printed on the badge with its barcode."
          error={errors.badgeNumber?.message}
        />
      </div>
      <SelectField {...form.register('locale')} label="Language at the bench" choices={locales} />
      <FormProblem problem={problem} />
      <div className="flex flex-wrap items-center gap-5">
        <Button type="submit" kind="filled" pending={sending ? 'Adding' : null}>
          Add the person
        </Button>
        <ButtonLink kind="link" href="/administration/people">
          Back to the people
        </ButtonLink>
      </div>
    </form>
  );
}

/** Name, sign-in and roles of someone with an account. New roles sign them out everywhere. */
export function ChangePersonForm({
  start,
  locales,
  change,
}: {
  start: ChangePersonForm;
  locales: LocaleChoice[];
  change: (input: unknown) => Promise<Outcome>;
}) {
  const router = useRouter();
  const toast = useToast();
  const form = useForm<ChangePersonForm, unknown, ChangePerson>({
    resolver: zodResolver(changePersonSchema),
    defaultValues: start,
  });
  const { send, problem, sending } = useActionForm(form, change, () => {
    toast('Changes saved');
    router.push(list(start.accountId));
  });
  const { errors } = form.formState;
  return (
    <form onSubmit={send} noValidate className="grid max-w-[620px] gap-5">
      <TextField {...form.register('name')} label="Name" autoComplete="off" error={errors.name?.message} />
      <RoleFields register={form.register} error={errors.roles?.message} />
      <TextField
        {...form.register('email')}
        label="E-mail"
        type="email"
        autoComplete="off"
        hint="Signs in with it at a desk. Leave it empty for benches only."
        error={errors.email?.message}
      />
      <div className="grid gap-5 sm:grid-cols-2">
        <TextField
          {...form.register('operatorNumber')}
          label="Number at the bench"
          mono
          autoComplete="off"
          error={errors.operatorNumber?.message}
        />
        <TextField
          {...form.register('badgeNumber')}
          label="Badge number"
          mono
          autoComplete="off"
          hint="A new number makes the old badge worthless."
          error={errors.badgeNumber?.message}
        />
      </div>
      <SelectField {...form.register('locale')} label="Language at the bench" choices={locales} />
      <TextField
        {...form.register('reason')}
        label="Reason"
        autoComplete="off"
        hint="Needed when roles change. It stands in the trail, and the person signs in again."
        error={errors.reason?.message}
      />
      <FormProblem problem={problem} />
      <div className="flex flex-wrap items-center gap-5">
        <Button type="submit" kind="filled" pending={sending ? 'Saving' : null}>
          Save the changes
        </Button>
        <ButtonLink kind="link" href={list(start.accountId)}>
          Back to the people
        </ButtonLink>
      </div>
    </form>
  );
}

import type { UseFormRegister } from 'react-hook-form';
import { CheckField } from '@/components/ui/check-field';
import { VerdictMark } from '@/components/ui/verdict-mark';
import { roles } from '@/lib/access/roles';
import { roleWords } from '@/lib/access/role-words';

/** The roles of a person, each with what it may do. */
export function RoleFields({
  register,
  error,
}: {
  // Any form with a list of roles; react-hook-form cannot say "a form that has this field".
  register: UseFormRegister<any>; // eslint-disable-line @typescript-eslint/no-explicit-any
  error?: string;
}) {
  return (
    <fieldset className="grid gap-0.5">
      <legend className="text-cap">Roles</legend>
      {roles.map((role) => (
        <CheckField
          key={role}
          {...register('roles')}
          value={role}
          label={roleWords[role].name}
          hint={roleWords[role].may}
        />
      ))}
      {error ? (
        <p role="alert" className="flex items-center gap-1.5 text-cap font-bold text-reject">
          <VerdictMark shape="reject" size={13} /> {error}
        </p>
      ) : null}
    </fieldset>
  );
}

import Link from 'next/link';
import { AddressChoice } from '@/components/desk/address-choice';
import { AddressText } from '@/components/desk/address-text';
import { CopyAddress } from '@/components/desk/copy-address';
import { count } from '@/components/desk/numbers';
import { Toolbar } from '@/components/ui/page-head';
import { roles } from '@/lib/access/roles';
import { roleWords } from '@/lib/access/role-words';
import type { PeopleFilter } from '@/lib/contracts/people-filter';

const states = [
  { value: 'active', label: 'active' },
  { value: 'locked', label: 'locked' },
  { value: 'closed', label: 'closed' },
  { value: 'all', label: 'all' },
];
const roleChoices = [
  { value: '', label: 'any role' },
  ...roles.map((role) => ({ value: role, label: roleWords[role].name })),
];

/** "Show active people with any role named any." */
export function PeopleToolbar({ filter, shown, all }: { filter: PeopleFilter; shown: number; all: number }) {
  const filtered = filter.state !== 'active' || filter.role !== null || filter.named !== '';
  return (
    <Toolbar
      count={
        <span className="flex items-center gap-4">
          <span>
            <b>{count(shown)}</b> of {count(all)}
          </span>
          {filtered ? <CopyAddress /> : null}
          {filtered ? (
            <Link className="sw-link text-cap" href="/administration/people">
              Show active people
            </Link>
          ) : null}
        </span>
      }
    >
      Show <AddressChoice name="state" label="State" choices={states} value={filter.state} /> people with{' '}
      <AddressChoice name="role" label="Role" choices={roleChoices} value={filter.role ?? ''} /> named{' '}
      <AddressText name="named" label="Part of the name, number or badge" value={filter.named} />
    </Toolbar>
  );
}

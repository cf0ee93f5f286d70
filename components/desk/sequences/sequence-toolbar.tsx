import Link from 'next/link';
import { Toolbar } from '@/components/ui/page-head';
import type { SequenceFilter } from '@/lib/contracts/sequence-pages';
import { AddressChoice } from '../address-choice';
import { AddressText } from '../address-text';
import { CopyAddress } from '../copy-address';
import { count } from '../numbers';

const states = [
  { value: 'all', label: 'all' },
  { value: 'draft', label: 'drafted' },
  { value: 'waiting', label: 'waiting' },
  { value: 'unreleased', label: 'unreleased' },
];

interface SequenceToolbarProps {
  filter: SequenceFilter;
  types: readonly { code: string }[];
  shown: number;
  all: number;
}

/** "Show all sequences for any board type named any." */
export function SequenceToolbar({ filter, types, shown, all }: SequenceToolbarProps) {
  const filtered = filter.state !== 'all' || filter.type !== null || filter.named !== '';
  const typeChoices = [
    { value: '', label: 'any board type' },
    ...types.map(({ code }) => ({ value: code, label: code })),
  ];
  return (
    <Toolbar
      count={
        <span className="flex items-center gap-4">
          <span>
            <b>{count(shown)}</b> of {count(all)}
          </span>
          {filtered ? <CopyAddress /> : null}
          {filtered ? (
            <Link className="sw-link text-cap" href="/sequences">
              Show all
            </Link>
          ) : null}
        </span>
      }
    >
      Show <AddressChoice name="state" label="State" choices={states} value={filter.state} /> sequences for{' '}
      <AddressChoice name="type" label="Board type" choices={typeChoices} value={filter.type ?? ''} /> named{' '}
      <AddressText name="named" label="Part of the name" value={filter.named} />
    </Toolbar>
  );
}

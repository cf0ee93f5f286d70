import Link from 'next/link';
import { Toolbar } from '@/components/ui/page-head';
import type { LotListFilter } from '@/lib/contracts/lot-filter';
import { AddressChoice } from '../address-choice';
import { CopyAddress } from '../copy-address';
import { count } from '../numbers';

const states = [
  { value: 'open', label: 'open' },
  { value: 'paused', label: 'paused' },
  { value: 'closed', label: 'closed' },
  { value: 'held', label: 'held' },
  { value: 'all', label: 'all' },
];
const spans = [
  { value: '30d', label: 'the last 30 days' },
  { value: '7d', label: 'the last 7 days' },
  { value: '1d', label: 'the last day' },
  { value: 'all', label: 'the beginning' },
];

interface LotToolbarProps {
  filter: LotListFilter;
  stations: { code: string; name: string }[];
  shown: number;
}

/** "Show open lots at all stations from the last 30 days." */
export function LotToolbar({ filter, stations, shown }: LotToolbarProps) {
  const places = [{ value: '', label: 'all stations' }, ...stations.map(({ code }) => ({ value: code, label: code }))];
  const filtered = filter.state !== 'open' || filter.station !== null || filter.from !== '30d';
  return (
    <Toolbar
      count={
        <span className="flex items-center gap-4">
          {filtered ? <CopyAddress /> : null}
          {filtered ? (
            <Link className="sw-link text-cap" href="/lots">
              Show open lots
            </Link>
          ) : null}
          <span>
            <b>{count(shown)}</b> {shown === 1 ? 'lot' : 'lots'}
          </span>
        </span>
      }
    >
      Show <AddressChoice name="state" label="State" choices={states} value={filter.state} /> lots at{' '}
      <AddressChoice name="station" label="Station" choices={places} value={filter.station ?? ''} /> from{' '}
      <AddressChoice name="from" label="Since" choices={spans} value={filter.from} />
    </Toolbar>
  );
}

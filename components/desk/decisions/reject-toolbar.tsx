import Link from 'next/link';
import { Toolbar } from '@/components/ui/page-head';
import type { RejectFilter } from '@/lib/contracts/reject-list';
import { rejectReasons } from '@/lib/run/types';
import { AddressChoice } from '../address-choice';
import { AddressText } from '../address-text';
import { CopyAddress } from '../copy-address';
import { count } from '../numbers';
import { rejectWords } from '../words';

const waits = [
  { value: 'all', label: 'anybody’s decision' },
  { value: 'decision', label: 'a decision on a reject' },
  { value: 'second', label: 'a second signature' },
  { value: 'stopped', label: 'quality, without a verdict' },
];
const withAny = (label: string, values: readonly { value: string; label: string }[]) => [
  { value: '', label },
  ...values,
];
const same = (values: readonly string[]) => values.map((value) => ({ value, label: value }));

interface RejectToolbarProps {
  filter: RejectFilter;
  boardTypes: string[];
  stations: string[];
  total: number;
}

/** "Boards of any type and lot that wait for anybody's decision, rejected for any reason at all stations." */
export function RejectToolbar({ filter, boardTypes, stations, total }: RejectToolbarProps) {
  const { type, lot, reason, station } = filter;
  const filtered = filter.waits !== 'all' || type || lot || reason || station;
  const reasons = rejectReasons.map((value) => ({ value, label: rejectWords[value] }));
  return (
    <Toolbar
      count={
        <span className="flex items-center gap-4">
          {filtered ? (
            <>
              <CopyAddress />
              <Link className="sw-link text-cap" href="/rejects">
                Show all
              </Link>
            </>
          ) : null}
          <span>
            <b>{count(total)}</b> {total === 1 ? 'board' : 'boards'}
          </span>
        </span>
      }
    >
      Boards of{' '}
      <AddressChoice
        name="type"
        label="Board type"
        choices={withAny('all types', same(boardTypes))}
        value={type ?? ''}
      />
      in lot <AddressText name="lot" label="Lot" value={lot ?? ''} />
      that wait for <AddressChoice name="waits" label="Waits for" choices={waits} value={filter.waits} />
      with <AddressChoice name="reason" label="Reason" choices={withAny('any reason', reasons)} value={reason ?? ''} />
      at{' '}
      <AddressChoice
        name="station"
        label="Station"
        choices={withAny('all stations', same(stations))}
        value={station ?? ''}
      />
    </Toolbar>
  );
}

import { FillInChoice } from '@/components/ui/fill-in';
import { Table, Td, Th } from '@/components/ui/table';
import type { IntervalMethod, LotReview } from '@/lib/contracts/lot-review';
import type { Yield } from '@/lib/statistics/proportions/yields';
import { count, percent } from '../../numbers';
import type { LotSectionProps } from '../lot-section';

const methods = [
  { value: 'exact', label: 'exact (Clopper–Pearson)' },
  { value: 'wilson', label: 'Wilson' },
];
const operationWords = { find: 'Find the points', trim: 'Trim, in one round', verify: 'Verify' };

type YieldsPanelProps = Pick<LotSectionProps, 'view' | 'changeView'> & { review: LotReview };

/** First-pass, final and rolled throughput yield, each with what it counts and its interval. */
export function YieldsPanel({ review, view, changeView }: YieldsPanelProps) {
  const { yields, withoutVerdict } = review;
  const unjudged = withoutVerdict.reduce((sum, row) => sum + row.runs, 0);
  return (
    <div className="grid gap-3">
      <p className="flex flex-wrap items-center gap-2 text-ink-2">
        95 % intervals,{' '}
        <FillInChoice
          label="Kind of interval"
          choices={methods}
          value={view.interval}
          onChange={(event) => changeView({ interval: event.target.value as IntervalMethod })}
        />
      </p>
      <Table stacks={false} aria-label="Yields">
        <thead>
          <tr>
            <Th>Yield</Th>
            <Th number>Boards</Th>
            <Th number>Share</Th>
            <Th number>Interval</Th>
          </tr>
        </thead>
        <tbody>
          <YieldRow name="First pass" of={[yields.passedFirst, yields.tested]} share={yields.first} strong />
          <YieldRow name="Final" of={[yields.passedLast, yields.tested]} share={yields.final} strong />
          <YieldRow name="Rolled throughput" of={null} share={yields.rolled} strong />
          {yields.operations.map(({ name, passedFirst, entered, share }) => (
            <YieldRow key={name} name={operationWords[name]} of={[passedFirst, entered]} share={share} />
          ))}
        </tbody>
      </Table>
      <p className="text-ink-2">
        Rolled throughput is the share that goes through all three without a second try or a second trim round; its
        interval joins Wilson intervals.{' '}
        {unjudged === 0
          ? 'Every run gave a verdict.'
          : `${count(unjudged)} ${unjudged === 1 ? 'run' : 'runs'} without a verdict ${unjudged === 1 ? 'is' : 'are'} in no yield: ${withoutVerdict
              .map(({ station, operator, runs }) => `${runs} at ${station} by operator ${operator}`)
              .join(', ')}.`}
      </p>
    </div>
  );
}

interface YieldRowProps {
  name: string;
  of: readonly [number, number] | null;
  share: Yield | null;
  strong?: boolean;
}

function YieldRow({ name, of, share, strong = false }: YieldRowProps) {
  return (
    <tr>
      <Td>{strong ? <b>{name}</b> : <span className="pl-4">{name}</span>}</Td>
      <Td number>{of ? `${count(of[0])} of ${count(of[1])}` : ''}</Td>
      <Td number>{strong ? <b>{percent(share?.share ?? null)}</b> : percent(share?.share ?? null)}</Td>
      <Td number>{share ? `${(share.low * 100).toFixed(1)} to ${percent(share.high)}` : '–'}</Td>
    </tr>
  );
}

import { quantityLooks } from '@/components/charts/quality/quantity-look';
import { Table, Td, Th } from '@/components/ui/table';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { LotReview } from '@/lib/contracts/lot-review';
import type { Capability, CapabilityStudy } from '@/lib/statistics/capability/capability-study';
import { count, index } from '../../numbers';
import { probabilityText } from './probability-text';

const nothing = {
  tooFew: 'Capability needs at least two measured boards.',
  noSpread: 'These values show no spread, so capability has no meaning.',
  noLimits: 'There are no limits for this quantity, so no capability.',
};

/** Cp, Cpk, Pp and Ppk with their intervals, what the normality test says, and whether any of it means something yet. */
export function CapabilityPanel({ review }: { review: LotReview }) {
  const { capability, stretches, quantity } = review;
  if (review.points.values.every((value) => value === null))
    return <p className="text-ink-2">No board is measured yet.</p>;
  if (capability.kind !== 'found') return <p className="text-ink-2">{nothing[capability.kind]}</p>;
  const byPercentile = capability.quoted === 'percentile';
  return (
    <div className="grid gap-3">
      {stretches.length > 0 ? (
        <p className="flex items-start gap-2.5 border-y border-rule py-2">
          <VerdictMark shape="check" size={19} />
          <span>
            <b>Not stable.</b> A chosen rule is broken, so these figures tell nothing of the boards to come.
          </span>
        </p>
      ) : null}
      <Table stacks={false} aria-label={`Capability, ${quantityLooks[quantity].name.toLowerCase()}`}>
        <thead>
          <tr>
            <Th>Index</Th>
            <Th number>Value</Th>
            <Th number>95 % interval</Th>
            <Th>From</Th>
          </tr>
        </thead>
        <tbody>
          {capability.shortTerm ? rowsOf(capability.shortTerm, ['Cp', 'Cpk'], 'mean moving range') : null}
          {rowsOf(capability.longTerm, ['Pp', 'Ppk'], 'all values')}
          {capability.percentile ? percentileRows(capability.percentile, byPercentile) : null}
        </tbody>
      </Table>
      <p className="text-ink-2">{normalityWords(capability)}</p>
    </div>
  );
}

function rowsOf(of: Capability, [both, nearer]: readonly [string, string], from: string) {
  return [
    of.cp === null ? null : <Row key={both} name={both} value={of.cp} interval={of.cpInterval} from={from} />,
    <Row key={nearer} name={nearer} value={of.cpk} interval={of.cpkInterval} from={from} />,
  ];
}

function percentileRows(of: NonNullable<CapabilityStudy['percentile']>, quoted: boolean) {
  return (['Pp', 'Ppk'] as const).map((name) => {
    const value = name === 'Pp' ? of.cp : of.cpk;
    if (value === null) return null;
    return (
      <Row key={`percentile ${name}`} name={name} value={value} interval={null} from="percentiles" quoted={quoted} />
    );
  });
}

interface RowProps {
  name: string;
  value: number;
  interval: { low: number; high: number } | null;
  from: string;
  quoted?: boolean;
}

function Row({ name, value, interval, from, quoted = false }: RowProps) {
  return (
    <tr>
      <Td>
        <b>{name}</b>
      </Td>
      <Td number>
        <b>{index(value)}</b>
      </Td>
      <Td number>{interval ? `${index(interval.low)} to ${index(interval.high)}` : '–'}</Td>
      <Td>
        {from}
        {quoted ? ', quoted' : ''}
      </Td>
    </tr>
  );
}

function normalityWords({ normality, quoted, percentile, count: boards }: CapabilityStudy): string {
  if (normality.kind !== 'found') return `${count(boards)} boards; too few to test whether the values are normal.`;
  const test = `${count(boards)} boards. Anderson–Darling: A² = ${normality.statistic.toFixed(2)}, ${probabilityText(normality.p)}.`;
  if (quoted === 'normal') return `${test} Nothing speaks against normal values.`;
  const extremes = percentile?.restsOnExtremes
    ? ' With so few boards the outer percentiles rest on the extremes, and say too much.'
    : '';
  return `${test} The values are not normal: the percentile method is quoted, and the intervals above do not hold.${extremes}`;
}

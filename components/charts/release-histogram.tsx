'use client';

import { scaleLinear } from 'd3-scale';
import { useId } from 'react';
import { Table, Td, Th } from '@/components/ui/table';
import { PointMark } from '@/components/ui/point-mark';
import type { ReleaseHistogram as Histogram } from '@/lib/circuit/monte-carlo/types';
import { ChartWithTable } from './chart-with-table';
import { useElementWidth } from './quality/use-element-width';

interface ReleaseHistogramProps {
  histogram: Histogram;
  limits: { min: number; max: number };
  targetVolts: number;
  boards: number;
}

const height = 108;
const base = 78;
const margin = 14;

/** Release points of the boards that reach the target, against the limits; those outside red and hatched. */
export function ReleaseHistogram(props: ReleaseHistogramProps) {
  const { histogram, targetVolts, boards } = props;
  const total = boards.toLocaleString('en-GB').replaceAll(',', '\u202f');
  return (
    <ChartWithTable
      title={
        <>
          <PointMark point="release" /> <span className="text-release">Release</span> after trimming to{' '}
          {targetVolts.toFixed(2)}, V
        </>
      }
      note={`${total} boards`}
      table={<HistogramTable {...props} />}
    >
      {histogram.counts.length === 0 ? (
        <p className="m-0 py-3">No board reaches {targetVolts.toFixed(2)} V.</p>
      ) : (
        <Drawing {...props} />
      )}
    </ChartWithTable>
  );
}

function binsOf({ histogram, limits }: ReleaseHistogramProps) {
  const { fromVolts, binVolts, counts } = histogram;
  return counts.map((count, i) => {
    const low = fromVolts + i * binVolts;
    const middle = low + binVolts / 2;
    return { low, high: low + binVolts, count, outside: middle < limits.min || middle > limits.max };
  });
}

function Drawing(props: ReleaseHistogramProps) {
  const { limits } = props;
  const [box, measured] = useElementWidth<HTMLDivElement>(440);
  const width = Math.max(280, measured);
  const bins = binsOf(props);
  const spread = limits.max - limits.min;
  const low = Math.min(limits.min - spread * 0.3, bins[0]!.low);
  const high = Math.max(limits.max + spread * 0.3, bins.at(-1)!.high);
  const x = scaleLinear([low, high], [margin, width - margin]);
  const most = Math.max(...bins.map(({ count }) => count));
  const y = scaleLinear([0, most], [base, 18]);
  const ticks = x.ticks(4).filter((tick) => x(tick) > margin + 12 && x(tick) < width - margin - 12);
  const hatch = useId();
  const gap = x(bins[0]!.high) - x(bins[0]!.low) > 3 ? 0.7 : 0;
  return (
    <div ref={box}>
      <svg
        role="img"
        aria-label={`Release of the trimmed boards against ${limits.min.toFixed(2)} to ${limits.max.toFixed(2)} volts`}
        viewBox={`0 0 ${width} ${height}`}
        width={width}
        height={height}
        className="block max-w-full"
      >
        <defs>
          <pattern id={hatch} width={5} height={5} patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
            <rect width={5} height={5} fill="var(--sw-reject)" />
            <path d="M0 0V5" stroke="var(--sw-paper)" strokeWidth={2} />
          </pattern>
        </defs>
        <rect
          x={x(limits.min)}
          width={x(limits.max) - x(limits.min)}
          y={12}
          height={base - 12}
          fill="var(--sw-release-wash)"
        />
        {bins.map(({ low: from, high: to, count, outside }) => (
          <rect
            key={from}
            x={x(from)}
            width={Math.max(0.5, x(to) - x(from) - gap)}
            y={y(count)}
            height={base - y(count)}
            fill={outside ? `url(#${hatch})` : 'var(--sw-release)'}
          />
        ))}
        <path d={`M${x(limits.min)} ${base}V8h-9zM${x(limits.max)} ${base}V8h9z`} fill="var(--sw-release)" />
        <g className="font-num" fontSize={14} fontWeight={700} fill="var(--sw-release)">
          <text x={x(limits.min) - 13} y={20} textAnchor="end">
            {limits.min.toFixed(2)}
          </text>
          <text x={x(limits.max) + 13} y={20}>
            {limits.max.toFixed(2)}
          </text>
        </g>
        <path d={`M${margin} ${base}H${width - margin}`} stroke="var(--sw-ink)" strokeWidth={1.5} />
        <g className="font-num" fontSize={14} fill="var(--sw-ink-2)" textAnchor="middle">
          {x.ticks(20).map((tick) => (
            <path key={tick} d={`M${x(tick)} ${base + 3}v${ticks.includes(tick) ? 8 : 4}`} stroke="var(--sw-ink-2)" />
          ))}
          {ticks.map((tick) => (
            <text key={tick} x={x(tick)} y={height - 5}>
              {tick}
            </text>
          ))}
        </g>
      </svg>
    </div>
  );
}

function HistogramTable(props: ReleaseHistogramProps) {
  return (
    <Table>
      <thead>
        <tr>
          <Th number>Release, V</Th>
          <Th number>Boards</Th>
          <Th>Limits</Th>
        </tr>
      </thead>
      <tbody>
        {binsOf(props).map(({ low, high, count, outside }) => (
          <tr key={low}>
            <Td number label="Release, V">
              {low.toFixed(3)}–{high.toFixed(3)}
            </Td>
            <Td number label="Boards">
              {count}
            </Td>
            <Td label="Limits">{outside ? 'outside' : 'inside'}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

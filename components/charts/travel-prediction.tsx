'use client';

import { scaleLinear } from 'd3-scale';
import { area, line } from 'd3-shape';
import { Table, Td, Th } from '@/components/ui/table';
import type { TravelPosition } from '@/lib/circuit/monte-carlo/types';
import { ChartWithTable } from './chart-with-table';
import type { PointLimits } from './predicted-supply-scale';
import { useElementWidth } from './quality/use-element-width';
import { ValueAxis } from './quality/value-axis';

interface TravelPredictionProps {
  travel: readonly TravelPosition[];
  limits: PointLimits;
  /** Screw of the typical board once trimmed; null where it cannot be. Turns. */
  typicalTurns: number | null;
  /** How the travel is spoken of. */
  unit: 'turns' | 'degrees';
}

const height = 262;
const margin = { top: 8, right: 12, bottom: 34, left: 62 };
const points = ['release', 'trip'] as const;

/** Trip and release over the trimmer's travel: the typical board, a band for 98 of 100 boards, the ideal zener thin. */
export function TravelPrediction(props: TravelPredictionProps) {
  return (
    <ChartWithTable
      title="Predicted over trimmer travel"
      note="bands: 98 of 100 boards"
      table={<TravelTable {...props} />}
    >
      <Drawing {...props} />
    </ChartWithTable>
  );
}

const spoken = (turns: number, unit: 'turns' | 'degrees') => (unit === 'degrees' ? turns * 360 : turns);
const spokenText = (turns: number, unit: 'turns' | 'degrees') =>
  unit === 'degrees' ? `${Math.round(turns * 360)}°` : `${turns.toFixed(1)} turns`;

function Drawing({ travel, limits, typicalTurns, unit }: TravelPredictionProps) {
  const [box, measured] = useElementWidth<HTMLDivElement>(440);
  const width = Math.max(280, measured);
  const last = travel.at(-1)?.turns ?? 1;
  const x = scaleLinear([0, last], [margin.left, width - margin.right]);
  const shown = travel.flatMap(({ bands }) => (bands ? [bands.trip.lowVolts, bands.release.highVolts] : []));
  const low = Math.min(limits.tripVolts.min, ...shown);
  const high = Math.max(limits.releaseVolts.max, ...shown);
  const y = scaleLinear([low, high], [height - margin.bottom, margin.top]).nice(6);
  const right = width - margin.right;
  return (
    <div ref={box}>
      <svg
        role="img"
        aria-label="Trip and release over the trimmer’s travel, with limits"
        viewBox={`0 0 ${width} ${height}`}
        width={width}
        height={height}
        className="block max-w-full"
      >
        <rect
          x={margin.left}
          y={margin.top}
          width={right - margin.left}
          height={height - margin.top - margin.bottom}
          fill="var(--sw-sheet)"
        />
        {points.map((point) => {
          const { min, max } = limits[`${point}Volts`];
          return (
            <g key={point}>
              <rect
                x={margin.left}
                width={right - margin.left}
                y={y(max)}
                height={y(min) - y(max)}
                fill={`var(--sw-${point}-wash)`}
              />
              <path
                d={`M${margin.left} ${y(max)}H${right}M${margin.left} ${y(min)}H${right}`}
                stroke={`var(--sw-${point})`}
              />
            </g>
          );
        })}
        {points.map((point) => (
          <PointCurves key={point} point={point} travel={travel} x={x} y={y} />
        ))}
        {points.map((point) => (
          <CurveLabel key={point} point={point} travel={travel} x={x} y={y} />
        ))}
        {typicalTurns === null ? null : (
          <g>
            <path
              d={`M${x(typicalTurns)} ${margin.top}V${height - margin.bottom}`}
              stroke="var(--sw-ink)"
              strokeDasharray="2 3"
            />
            <text
              x={x(typicalTurns) + (x(typicalTurns) > width / 2 ? -6 : 6)}
              y={margin.top + 15}
              textAnchor={x(typicalTurns) > width / 2 ? 'end' : 'start'}
              fontSize={13}
              fill="var(--sw-ink)"
            >
              typical board, {spokenText(typicalTurns, unit)}
            </text>
          </g>
        )}
        <ValueAxis y={y} x={margin.left} ticks={6} text={(volts) => String(volts)} />
        <TravelAxis last={last} unit={unit} x={x} />
      </svg>
    </div>
  );
}

interface CurvesProps {
  point: 'trip' | 'release';
  travel: readonly TravelPosition[];
  x(turns: number): number;
  y(volts: number): number;
}

function PointCurves({ point, travel, x, y }: CurvesProps) {
  const colour = `var(--sw-${point})`;
  const key = `${point}Volts` as const;
  const band = area<TravelPosition>()
    .defined(({ bands }) => bands !== null)
    .x(({ turns }) => x(turns))
    .y0(({ bands }) => y(bands![point].lowVolts))
    .y1(({ bands }) => y(bands![point].highVolts));
  const typical = line<TravelPosition>()
    .defined((at) => at.typical !== null)
    .x(({ turns }) => x(turns))
    .y((at) => y(at.typical![key]));
  const ideal = line<TravelPosition>()
    .x(({ turns }) => x(turns))
    .y((at) => y(at.ideal[key]));
  return (
    <g fill="none" stroke={colour}>
      <path d={band(travel) ?? ''} fill={colour} fillOpacity={0.25} stroke="none" />
      <path d={ideal(travel) ?? ''} strokeDasharray="1 4" />
      <path d={typical(travel) ?? ''} strokeWidth={2} />
    </g>
  );
}

function CurveLabel({ point, travel, x, y }: CurvesProps) {
  const at = travel[Math.floor(travel.length * (point === 'trip' ? 0.8 : 0.16))];
  if (!at?.bands) return null;
  const [atX, atY] =
    point === 'trip'
      ? [x(at.turns), y(at.bands.trip.lowVolts) + 22]
      : [x(at.turns), y(at.bands.release.highVolts) - 12];
  return (
    <g fill={`var(--sw-${point})`}>
      <path d={`M${atX - 14} ${atY + (point === 'trip' ? -9 : 0)}h10l-5 ${point === 'trip' ? 9 : -9}z`} />
      <text x={atX} y={atY} fontSize={13} fontWeight={700}>
        {point}
      </text>
    </g>
  );
}

function TravelAxis({ last, unit, x }: { last: number; unit: 'turns' | 'degrees'; x(turns: number): number }) {
  const whole = spoken(last, unit);
  const ticks = scaleLinear([0, whole], [0, 1]).ticks(4);
  const toTurns = (value: number) => (value / whole) * last;
  const base = height - margin.bottom + 3;
  return (
    <g className="font-num" fontSize={14} fill="var(--sw-ink-2)" textAnchor="middle">
      {ticks.map((tick) => (
        <g key={tick}>
          <path d={`M${x(toTurns(tick))} ${base}v8`} stroke="var(--sw-ink-2)" />
          {tick < whole * 0.8 ? (
            <text x={x(toTurns(tick))} y={height - 7}>
              {tick}
            </text>
          ) : null}
        </g>
      ))}
      <path d={`M${x(last)} ${base}v8`} stroke="var(--sw-ink-2)" />
      <text x={x(last)} y={height - 7} textAnchor="end">
        {unit === 'degrees' ? `${Math.round(whole)}°` : `${whole} turns`}
      </text>
    </g>
  );
}

function TravelTable({ travel, unit }: TravelPredictionProps) {
  const every = Math.max(1, Math.floor(travel.length / 10));
  const volts = (value: number | undefined) => value?.toFixed(2) ?? '–';
  const range = (band: { lowVolts: number; highVolts: number } | undefined) =>
    band ? `${volts(band.lowVolts)}–${volts(band.highVolts)}` : '–';
  return (
    <Table>
      <thead>
        <tr>
          <Th number>Screw at</Th>
          <Th number>Trip, V</Th>
          <Th number>98 of 100</Th>
          <Th number>Release, V</Th>
          <Th number>98 of 100</Th>
          <Th number>Hysteresis, V</Th>
        </tr>
      </thead>
      <tbody>
        {travel
          .filter((_, i) => i % every === 0)
          .map(({ turns, typical, bands }) => (
            <tr key={turns}>
              <Td number label="Screw at">
                {spokenText(turns, unit)}
              </Td>
              <Td number label="Trip, V">
                {volts(typical?.tripVolts)}
              </Td>
              <Td number label="98 of 100">
                {range(bands?.trip)}
              </Td>
              <Td number label="Release, V">
                {volts(typical?.releaseVolts)}
              </Td>
              <Td number label="98 of 100">
                {range(bands?.release)}
              </Td>
              <Td number label="Hysteresis, 98 of 100, V">
                {range(bands?.hysteresis)}
              </Td>
            </tr>
          ))}
      </tbody>
    </Table>
  );
}

import { scaleLinear } from 'd3-scale';
import type { Ref } from 'react';
import type { LotReview } from '@/lib/contracts/lot-review';
import { shownDomain } from './chart-scale';
import { LimitGround, LimitLines } from './limit-lines';
import { quantityLooks, scaleText, valueText } from './quantity-look';
import { ValueAxis } from './value-axis';

interface StripsProps {
  review: LotReview;
  width: number;
  label: string;
  ref?: Ref<SVGSVGElement>;
}

const height = 300;
const top = 14;
const bottom = 240;
const left = 64;
const widest = 84;

/** A stroke a board, so that many of them still show where they crowd; side by side for every group, its mean as a long line. */
export function Strips({ review, width, label, ref }: StripsProps) {
  const { points, limits, quantity, comparison, baseline } = review;
  const measured = points.values.filter((value) => value !== null);
  const domain = shownDomain({ values: measured, limits, control: baseline.kind === 'frozen' ? baseline : null });
  const y = scaleLinear(domain, [bottom, top]).clamp(true);
  const right = width - 74;
  const pitch = (right - left) / Math.max(comparison.groups.length, 1);
  const half = Math.min(widest, pitch * 0.7) / 2;
  const middle = (group: number) => left + (group + 0.5) * pitch;
  const strokes = comparison.groups.map((_, group) =>
    points.values
      .flatMap((value, place) =>
        value === null || points.group[place] !== group
          ? []
          : [`M${(middle(group) - half).toFixed(1)} ${y(value).toFixed(1)}h${(2 * half).toFixed(1)}`],
      )
      .join(''),
  );
  const look = quantityLooks[quantity];
  return (
    <svg
      ref={ref}
      viewBox={`0 0 ${width} ${height}`}
      width={width}
      height={height}
      role="img"
      aria-label={label}
      className="block h-auto max-w-full"
    >
      <LimitGround y={y} limits={limits} across={[[left, right]]} />
      <LimitLines
        y={y}
        limits={limits}
        colour={look.colour}
        across={[[left, right]]}
        jawX={right}
        centre={null}
        narrow
        text={(value) => scaleText(quantity, value)}
        fineText={(value) => valueText(quantity, value)}
      />
      <ValueAxis y={y} x={left - 4} ticks={6} text={(value) => scaleText(quantity, value)} />
      <g fontSize={13} textAnchor="end" fill="var(--sw-ink-2)">
        {pitch > 52 ? (
          <text x={left - 10} y={bottom + 40}>
            mean
          </text>
        ) : null}
        <text x={left - 10} y={bottom + 57}>
          boards
        </text>
      </g>
      {comparison.groups.map((group, i) => (
        <g key={group.label}>
          <path d={strokes[i]} stroke="var(--sw-ink)" strokeWidth={1} opacity={0.45} />
          <path d={`M${middle(i) - half - 8} ${y(group.mean)}h${2 * half + 16}`} stroke={look.colour} strokeWidth={3} />
          <g fontSize={13} textAnchor="middle" fill="var(--sw-ink-2)">
            <text x={middle(i)} y={bottom + 22} fontSize={14} fontWeight={700} fill="var(--sw-ink)">
              {shortened(group.label, pitch)}
            </text>
            <text x={middle(i)} y={bottom + 40} className="font-num">
              {pitch > 52 ? valueText(quantity, group.mean) : ''}
            </text>
            <text x={middle(i)} y={bottom + 57} className="font-num">
              {group.boards}
            </text>
          </g>
        </g>
      ))}
    </svg>
  );
}

const shortened = (text: string, room: number) => {
  const most = Math.max(2, Math.floor(room / 8));
  return text.length > most ? `${text.slice(0, most - 1)}…` : text;
};

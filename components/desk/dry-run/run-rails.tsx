import { RailsHeads } from '@/components/bench/rails/rails-heads';
import { heightOf, railsBox, tubeEdge } from '@/lib/rails/rails-geometry';
import { RailsScale } from '@/components/bench/rails/rails-scale';
import { RailsTube } from '@/components/bench/rails/rails-tube';
import type { RailsView } from '@/lib/contracts/bench-view';
import type { BoardType } from '@/lib/contracts/board-type';
import type { Bins, DryRunResult } from '@/lib/contracts/dry-run';
import { English } from '../english';

interface RunRailsProps {
  boardType: BoardType;
  result: DryRunResult | null;
  draftName: string;
  /** Null: nothing is released. */
  releasedName: string | null;
}

const marginVolts = 1;
const half = (volts: number) => Math.round(volts * 2) / 2;
const middle = (railsBox.tripX + railsBox.releaseX) / 2;
const reach = 150;

/** What the rails of a board type show before anything is measured. */
export function railsFor({ limits }: BoardType): RailsView {
  const { tripVolts, releaseVolts } = limits;
  const scaleMinVolts = half(tripVolts.min - marginVolts);
  return {
    scaleMinVolts,
    scaleMaxVolts: half(releaseVolts.max + marginVolts),
    tripLimits: tripVolts,
    releaseLimits: releaseVolts,
    guardVolts: null,
    targetVolts: null,
    flags: [],
    travelled: {
      fallingOnToVolts: (tripVolts.min + tripVolts.max) / 2,
      fallingOffToVolts: scaleMinVolts,
      risingOffToVolts: (releaseVolts.min + releaseVolts.max) / 2,
      risingOn: true,
    },
    hysteresisVolts: null,
  };
}

/** Trip and release of the boards that were verified, against their limits: the draft solid, the released revision dashed. */
export function RunRails({ boardType, result, draftName, releasedName }: RunRailsProps) {
  const rails = railsFor(boardType);
  const sides = ['trip', 'release'] as const;
  const shared = result?.released && releasedName;
  return (
    <English>
      <svg
        viewBox={`0 0 ${railsBox.width} ${railsBox.height}`}
        role="img"
        aria-label={`Trip and release of simulated boards against their limits. ${spokenSpread(result)}`}
        className="block h-auto w-full"
      >
        <RailsHeads />
        <RailsTube rails={rails} />
        {sides.map((side) => (
          <g key={side}>
            <RailsScale rails={rails} side={side} showsTarget={false} targetLabel="" />
            {result ? <Spread rails={rails} side={side} bins={result.draft[side]} look="solid" /> : null}
            {result?.released ? <Spread rails={rails} side={side} bins={result.released[side]} look="dashed" /> : null}
          </g>
        ))}
        <g textAnchor="middle" fontSize={24}>
          {result ? (
            <text x={middle} y={railsBox.bottomY - 64} fontWeight={700} fill="var(--sw-ink)">
              {shared ? `solid ${draftName}` : `${result.draft.firstPass.of} boards`}
            </text>
          ) : (
            <text x={middle} y={400} fill="var(--sw-ink-2)">
              no dry run yet
            </text>
          )}
          {shared ? (
            <text x={middle} y={railsBox.bottomY - 32} fill="var(--sw-ink-2)">
              dashed {releasedName}
            </text>
          ) : null}
        </g>
      </svg>
    </English>
  );
}

interface SpreadProps {
  rails: RailsView;
  side: 'trip' | 'release';
  bins: Bins;
  look: 'solid' | 'dashed';
}

/** A histogram lying at its rail; its most frequent value reaches farthest. */
function Spread({ rails, side, bins, look }: SpreadProps) {
  const most = Math.max(...bins.counts);
  if (bins.counts.length === 0 || most === 0) return null;
  const out = side === 'trip' ? 1 : -1;
  const base = (side === 'trip' ? railsBox.tripX : railsBox.releaseX) + out * (tubeEdge + 3);
  const y = (volts: number) => heightOf(rails, volts).toFixed(1);
  const steps = bins.counts.map((count, i) => {
    const x = (base + (out * reach * count) / most).toFixed(1);
    return `V${y(bins.from + i * bins.width)}H${x}V${y(bins.from + (i + 1) * bins.width)}`;
  });
  const path = `M${base} ${y(bins.from)}${steps.join('')}H${base}Z`;
  const colour = `var(--sw-${side})`;
  return look === 'solid' ? (
    <path d={path} fill={colour} stroke={colour} strokeWidth={1.5} strokeLinejoin="round" />
  ) : (
    <path d={path} fill="none" stroke="var(--sw-ink)" strokeWidth={1.6} strokeDasharray="4 3" />
  );
}

function spokenSpread(result: DryRunResult | null): string {
  if (!result) return 'No dry run yet.';
  return (['trip', 'release'] as const)
    .map((side) => {
      const { from, width, counts } = result.draft[side];
      if (counts.length === 0) return `No ${side} measured yet.`;
      return `${side === 'trip' ? 'Trip' : 'Release'} from ${from.toFixed(3)} to ${(from + width * counts.length).toFixed(3)} V.`;
    })
    .join(' ');
}

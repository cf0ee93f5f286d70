import { scaleLinear } from 'd3-scale';
import type { DryRunResult, DryRunSide } from '@/lib/contracts/dry-run';
import { count, percent } from '../numbers';

interface SettlingChartProps {
  result: DryRunResult;
  boards: number;
  draftName: string;
  releasedName: string | null;
  running: boolean;
}

const height = 236;
const [left, top, bottom] = [62, 10, 28];

/** Drawn for a desk and once more for a phone, where its words stand below. */
export function SettlingChart(props: SettlingChartProps) {
  return (
    <>
      <div className="max-sm:hidden">
        <Settling {...props} width={880} right={170} />
      </div>
      <div className="sm:hidden">
        <Settling {...props} width={400} right={16} />
        <p className="text-cap">{endWords(props).join(', ')}</p>
      </div>
    </>
  );
}

/** First-pass yield after so many boards: it settles on the final figure, inside its band 95 times of 100. */
function Settling(props: SettlingChartProps & { width: number; right: number }) {
  const { result, boards, running, width, right } = props;
  const { draft, released } = result;
  const lines = [draft, ...(released ? [released] : [])].filter(({ settling }) => settling.length > 0);
  if (lines.length === 0) return <p className="text-ink-2">The first 20 boards are not done yet.</p>;
  const late = lines.flatMap(({ settling }) => settling.slice(Math.floor(settling.length / 4)));
  const low = Math.max(0, Math.floor(Math.min(...late.map((point) => point.low)) * 50 - 0.5) / 50);
  const x = scaleLinear([0, boards], [left, width - right]);
  const y = scaleLinear([low, 1], [height - bottom, top]);
  const clip = (share: number) => y(Math.max(low, share)).toFixed(1);
  const line = ({ settling }: DryRunSide, of: 'share' | 'low' | 'high') =>
    settling.map((point, i) => `${i === 0 ? 'M' : 'L'}${x(point.boards).toFixed(1)} ${clip(point[of])}`).join('');
  const band = [
    ...draft.settling.map((point) => `${x(point.boards).toFixed(1)} ${clip(point.high)}`),
    ...draft.settling.toReversed().map((point) => `${x(point.boards).toFixed(1)} ${clip(point.low)}`),
  ];
  const ends = endsOf(lines, y);
  const nowX = x(draft.settling.at(-1)?.boards ?? 0);
  return (
    <figure>
      <svg viewBox={`0 0 ${width} ${height}`} role="img" aria-label={spoken(result)} className="block h-auto w-full">
        <rect x={left} y={top} width={width - left - right} height={height - top - bottom} fill="var(--sw-sheet)" />
        {band.length > 0 ? <path d={`M${band.join('L')}Z`} fill="var(--sw-well)" /> : null}
        <g className="font-num" fontSize={14} fill="var(--sw-ink-2)" stroke="none">
          {y.ticks(4).map((tick) => (
            <g key={tick}>
              <path d={`M${left - 8} ${y(tick)}h8`} stroke="var(--sw-rule)" />
              <text x={left - 12} y={y(tick) + 5} textAnchor="end">
                {Math.round(tick * 100)}
                {tick === y.ticks(4).at(-1) ? ' %' : ''}
              </text>
            </g>
          ))}
          {x.ticks(4).map((tick) => (
            <g key={tick}>
              <path d={`M${x(tick)} ${height - bottom}v7`} stroke="var(--sw-rule)" />
              <text x={x(tick)} y={height - 6} textAnchor="middle">
                {count(tick)}
              </text>
            </g>
          ))}
        </g>
        <g fill="none" stroke="var(--sw-ink)">
          {released ? (
            <>
              <path d={line(released, 'share')} strokeWidth={2} strokeDasharray="7 4" />
              <path d={`${line(released, 'low')}${line(released, 'high')}`} strokeWidth={1} strokeDasharray="1.5 3" />
            </>
          ) : null}
          <path d={line(draft, 'share')} strokeWidth={3} />
          {running ? (
            <>
              <path d={`M${nowX} ${top}V${height - bottom}`} strokeWidth={2} />
              <circle cx={nowX} cy={clip(draft.settling.at(-1)!.share)} r={6} fill="var(--sw-paper)" strokeWidth={3} />
            </>
          ) : null}
        </g>
        {right > 100 ? (
          <g fontSize={15} fill="var(--sw-ink)">
            {endWords(props).map((words, i) => (
              <text key={words} x={width - right + 8} y={ends[i]! + 5} fontWeight={i === 0 ? 700 : 400}>
                {words}
              </text>
            ))}
          </g>
        ) : null}
      </svg>
    </figure>
  );
}

/** r7 94.1 % ± 1.0, then the released revision. */
function endWords({ result: { draft, released }, draftName, releasedName }: SettlingChartProps): string[] {
  const words = (name: string, side: DryRunSide) =>
    `${name} ${percent(side.firstPass.count / side.firstPass.of)} ± ${halfWidth(side)}`;
  const isDrawn = (side: DryRunSide | null): side is DryRunSide => side !== null && side.settling.length > 0;
  return [
    ...(isDrawn(draft) ? [words(draftName, draft)] : []),
    ...(isDrawn(released) && releasedName ? [words(releasedName, released)] : []),
  ];
}

const halfWidth = ({ firstPass: { low, high } }: DryRunSide) => (((high - low) / 2) * 100).toFixed(1);

/** Heights of the words at the lines' ends, kept apart. */
function endsOf(lines: DryRunSide[], y: (share: number) => number): number[] {
  const [a = 0, b] = lines.map(({ settling }) => y(settling.at(-1)!.share));
  if (b === undefined) return [a];
  const gap = 20 - Math.abs(a - b);
  return gap <= 0 ? [a, b] : a < b ? [a - gap / 2, b + gap / 2] : [a + gap / 2, b - gap / 2];
}

function spoken({ draft, released }: DryRunResult): string {
  const last = draft.settling.at(-1);
  const ofDraft = last ? `After ${last.boards} boards the draft passes ${percent(last.share)}` : 'No boards yet';
  const old = released?.settling.at(-1);
  return old ? `${ofDraft}, the released revision ${percent(old.share)}.` : `${ofDraft}.`;
}

import { useTranslations } from 'next-intl';
import { useNumbers } from '../use-numbers';
import type { PlacedFlag } from '@/lib/rails/inside-blocks';
import { railsBox, tubeEdge } from '@/lib/rails/rails-geometry';

const tip = 20;

/** A found value: a flag whose point stands on the tube. Hollow when it is of an earlier attempt or no longer true. */
export function RailFlagShape({ placed, shiftVolts }: { placed: PlacedFlag; shiftVolts: number | null }) {
  const t = useTranslations('bench.rails');
  const { volts, signedVolts } = useNumbers();
  const { flag, pointY, boxY, height, noteBelow, shift } = placed;
  const inward = flag.side === 'trip' ? 1 : -1;
  const edge = (flag.side === 'trip' ? railsBox.tripX : railsBox.releaseX) + inward * tubeEdge;
  const x = edge + inward * 4;
  const label = volts(flag.volts);
  const size = flag.hollow ? 40 : 46;
  const width = size * 0.6 * label.length + 34;
  const near = x + inward * tip;
  const far = near + inward * width;
  const top = boxY - height / 2;
  const bottom = boxY + height / 2;
  const join = (dy: number) => Math.min(bottom, Math.max(top, pointY + dy));
  const upper = join(-13);
  const lower = join(13);
  const colour = `var(--sw-${flag.side})`;
  const outside = flag.note === 'too-high' || flag.note === 'too-low';
  const noteY = noteBelow ? bottom + 32 : top - 12;
  const line = noteBelow ? { from: top, up: -1 } : { from: bottom, up: 1 };
  return (
    <g data-flag={flag.side}>
      <path
        d={`M${x} ${pointY}L${near} ${Math.min(upper, bottom - 6)}V${top}H${far}V${bottom}H${near}V${Math.max(lower, top + 6)}Z`}
        fill={flag.hollow ? 'var(--sw-paper)' : colour}
        stroke={flag.hollow ? colour : 'none'}
        strokeWidth={2}
        strokeLinejoin="round"
      />
      <path
        d={`M${edge + inward * 2} ${pointY}h${-inward * (railsBox.tube + 8)}`}
        stroke={flag.hollow ? colour : 'var(--sw-ink)'}
        strokeWidth={flag.hollow ? 2 : 4.5}
      />
      <text
        x={(near + far) / 2}
        y={boxY + size * 0.34}
        textAnchor="middle"
        className="font-num"
        fontWeight={700}
        fontSize={size}
        fill={flag.hollow ? colour : `var(--sw-on-${flag.side})`}
      >
        {label}
      </text>
      {flag.note && (
        <text
          x={inward > 0 ? near + 4 : near - 6}
          y={noteY}
          textAnchor={inward > 0 ? 'start' : 'end'}
          fontWeight={700}
          fontSize={30}
          fill={outside && flag.side === 'release' ? 'var(--sw-reject)' : 'var(--sw-ink)'}
        >
          {t(`notes.${flag.note}`)}
        </text>
      )}
      {shift && shiftVolts !== null && (
        <g fill="var(--sw-accent)">
          <path
            d={`M${near + 16} ${line.from + line.up * 3}v${line.up * 28}`}
            stroke="var(--sw-accent)"
            strokeWidth={12}
          />
          <path d={`M${near - 1} ${line.from + line.up * 30}l17 ${line.up * 22} 17 ${-line.up * 22}z`} />
          <text x={near + 44} y={line.from + line.up * 26 + 12} className="font-num" fontWeight={700} fontSize={36}>
            {signedVolts(shiftVolts)}
          </text>
        </g>
      )}
    </g>
  );
}

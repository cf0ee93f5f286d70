import { useTranslations } from 'next-intl';
import type { RailsView } from '@/lib/contracts/bench-view';
import { useNumbers } from '../use-numbers';
import { stripBox, stripHeight, stripWindow, zigzag } from './strip-geometry';

interface MagnifiedStripProps {
  rails: RailsView;
  targetVolts: number;
  toleranceVolts: number;
  heldVolts: number | null;
  /** Last or live trip point: hollow flag with its note. */
  trip: { volts: number; note: string; live: boolean } | null;
}

const { tubeX, tube, topY, bottomY, width, height } = stripBox;
const inner = tubeX - tube / 2;
const outer = tubeX + tube / 2;

/** A window of the trip rail around the target, since small shares of a volt cannot be seen on the full rail. */
export function MagnifiedStrip({ rails, targetVolts, toleranceVolts, heldVolts, trip }: MagnifiedStripProps) {
  const t = useTranslations('bench.strip');
  const { volts, signedVolts } = useNumbers();
  const scope = stripWindow(targetVolts, toleranceVolts);
  const y = (at: number) => stripHeight(scope, at);
  const [top, bottom] = [y(targetVolts + toleranceVolts), y(targetVolts - toleranceVolts)];
  const solidTo = heldVolts === null ? null : y(heldVolts);
  const shown = trip && trip.volts >= scope.minVolts && trip.volts <= scope.maxVolts ? trip : null;
  const away = trip ? targetVolts - trip.volts : 0;
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={t('aria')}
      className="block h-full w-full overflow-visible"
    >
      <rect x={-4} width={width + 4} y={76} height={594} fill="var(--sw-sheet)" />
      <StripTicks scope={scope} />
      <g className="font-num" fontSize={28} textAnchor="end" fill="var(--sw-ink-2)">
        <text x={98} y={topY + 10}>
          {volts(scope.maxVolts)}
        </text>
        <text x={98} y={bottomY + 10}>
          {volts(scope.minVolts)}
        </text>
      </g>
      <rect x={inner - 66} y={top} width={62} height={bottom - top} fill="var(--sw-trip-wash)" />
      <path
        d={`M${inner - 2} ${top}H${inner - 66}v-28ZM${inner - 2} ${bottom}H${inner - 66}v28Z`}
        fill="var(--sw-trip)"
      />
      <path d={`M${inner - 4} ${y(targetVolts)}h-62`} stroke="var(--sw-trip)" strokeWidth={4} />
      <g className="font-num" fontWeight={700} fontSize={31} textAnchor="end" fill="var(--sw-trip)">
        <text x={inner - 72} y={top + 4}>
          {volts(targetVolts + toleranceVolts)}
        </text>
        <text x={inner - 72} y={y(targetVolts) + 6}>
          {volts(targetVolts)}
        </text>
        <text x={inner - 72} y={bottom + 22}>
          {volts(targetVolts - toleranceVolts)}
        </text>
      </g>
      <text x={inner - 72} y={y(targetVolts) + 34} textAnchor="end" fontSize={25} fill="var(--sw-trip)">
        {t('target')}
      </text>
      <rect x={inner} y={topY} width={tube} height={bottomY - topY} fill="var(--sw-paper)" stroke="var(--sw-rule)" />
      {solidTo !== null && <rect x={inner} y={topY} width={tube} height={solidTo - topY} fill="var(--sw-trip)" />}
      <path d={`${zigzag(topY)}${zigzag(bottomY)}`} fill="none" stroke="var(--sw-ink)" strokeWidth={3} />
      {rails.tripLimits && <PinnedLimits limits={rails.tripLimits} scope={scope} />}
      {shown && <StripFlag y={y(shown.volts)} label={volts(shown.volts)} note={shown.note} live={shown.live} />}
      {shown && Math.abs(away) > toleranceVolts / 4 && (
        <StripShift from={y(shown.volts)} to={y(targetVolts)} label={signedVolts(away)} />
      )}
      {heldVolts !== null && (
        <g>
          <circle cx={tubeX} cy={y(heldVolts)} r={34} fill="var(--sw-paper)" stroke="var(--sw-ink)" strokeWidth={9} />
          <circle cx={tubeX} cy={y(heldVolts)} r={10} fill="var(--sw-ink)" />
          <text x={outer + 27} y={y(heldVolts) + 2} fontSize={29} fill="var(--sw-ink)">
            {t('held')}
          </text>
          <text
            x={outer + 27}
            y={y(heldVolts) + 36}
            className="font-num"
            fontWeight={700}
            fontSize={33}
            fill="var(--sw-ink)"
          >
            {volts(heldVolts)}
          </text>
        </g>
      )}
    </svg>
  );
}

function StripTicks({ scope }: { scope: ReturnType<typeof stripWindow> }) {
  return Array.from({ length: 51 }, (_, i) => {
    const y = topY + (i * (bottomY - topY)) / 50;
    const long = i % 5 === 0;
    return (
      <path
        key={`${scope.minVolts}-${i}`}
        d={`M${inner - 5} ${y}h${long ? -43 : -20}`}
        stroke={long ? 'var(--sw-ink-2)' : 'var(--sw-rule)'}
        strokeWidth={long ? 2.5 : 1.5}
      />
    );
  });
}

/** Limits of the board type that lie outside the window: pinned at its ends, with arrow and number. */
function PinnedLimits({
  limits,
  scope,
}: {
  limits: { min: number; max: number };
  scope: ReturnType<typeof stripWindow>;
}) {
  const t = useTranslations('bench.strip');
  const { volts } = useNumbers();
  return (
    <g fill="var(--sw-trip)" fontSize={28}>
      {limits.max > scope.maxVolts && (
        <>
          <path d="M92 65h20l-10-18z" />
          <text x={120} y={65}>
            {t('limit')}{' '}
            <tspan className="font-num" fontWeight={700}>
              {volts(limits.max)}
            </tspan>
          </text>
        </>
      )}
      {limits.min < scope.minVolts && (
        <>
          <path d="M92 684h20l-10 18z" />
          <text x={120} y={702}>
            {t('limit')}{' '}
            <tspan className="font-num" fontWeight={700}>
              {volts(limits.min)}
            </tspan>
          </text>
        </>
      )}
    </g>
  );
}

function StripFlag({ y, label, note, live }: { y: number; label: string; note: string; live: boolean }) {
  const box = { top: Math.min(y - 32, bottomY - 96), x: outer + 22 };
  return (
    <g>
      <path d={`M${inner - 4} ${y}h${tube + 6}`} stroke="var(--sw-trip)" strokeWidth={4} />
      <path
        d={`M${outer + 3} ${y}l19-14V${box.top}h166v64H${box.x}V${y + 14}Z`}
        fill={live ? 'var(--sw-trip)' : 'var(--sw-sheet)'}
        stroke="var(--sw-trip)"
        strokeWidth={3}
      />
      <text
        x={box.x + 83}
        y={box.top + 49}
        textAnchor="middle"
        className="font-num"
        fontWeight={700}
        fontSize={47}
        fill={live ? 'var(--sw-on-trip)' : 'var(--sw-trip)'}
      >
        {label}
      </text>
      <text x={box.x + 3} y={box.top + 95} fontSize={29} fill="var(--sw-ink)">
        {note}
      </text>
    </g>
  );
}

/** The blue arrow from the last point to the target, kept clear of flag and held dot; left out where it has no room. */
function StripShift({ from, to, label }: { from: number; to: number; label: string }) {
  const up = to < from ? -1 : 1;
  const start = from + up * 42;
  const end = to - up * 52;
  if ((end - start) * up < 40) return null;
  const x = outer + 50;
  return (
    <g fill="var(--sw-accent)">
      <path d={`M${x} ${start}V${end - up * 28}`} stroke="var(--sw-accent)" strokeWidth={16} />
      <path d={`M${x - 24} ${end - up * 30}L${x} ${end}l24 ${-up * 30}z`} />
      <text x={x + 30} y={(start + end) / 2 + 13} className="font-num" fontWeight={700} fontSize={37}>
        {label}
      </text>
    </g>
  );
}

import type { RailsView } from '@/lib/contracts/bench-view';
import { heightOf, railsBox, tubePaths } from '@/lib/rails/rails-geometry';

const { tripX, releaseX, topY, bottomY, radius, tube } = railsBox;

/** Tube solid where the load was on, hollow where it was off, thin and grey where the supply has not been. */
export function RailsTube({ rails }: { rails: RailsView }) {
  const { fallingOnToVolts, fallingOffToVolts, risingOffToVolts, risingOn } = rails.travelled;
  const y = (volts: number) => heightOf(rails, volts);
  const onEnd = fallingOnToVolts === null ? null : y(fallingOnToVolts);
  const offEnd = fallingOffToVolts === null ? null : y(fallingOffToVolts);
  const riseEnd = risingOffToVolts === null ? null : y(risingOffToVolts);
  return (
    <g fill="none">
      <path d={tubePaths.loop} stroke="var(--sw-rule)" strokeWidth={tube + 2} />
      <path d={tubePaths.loop} stroke="var(--sw-paper)" strokeWidth={tube - 1} />
      {riseEnd !== null && <Hollow d={tubePaths.bottom} colour="var(--sw-ink-2)" />}
      {onEnd !== null && <Solid d={tubePaths.top} colour="var(--sw-ink-2)" />}
      {onEnd !== null && <Solid d={tubePaths.straight('trip', topY, onEnd)} colour="var(--sw-trip)" />}
      {offEnd !== null && <Hollow d={tubePaths.straight('trip', onEnd ?? topY, offEnd)} colour="var(--sw-trip)" />}
      {riseEnd !== null && <Hollow d={tubePaths.straight('release', bottomY, riseEnd)} colour="var(--sw-release)" />}
      {riseEnd !== null && risingOn && (
        <Solid d={tubePaths.straight('release', riseEnd, topY)} colour="var(--sw-release)" />
      )}
      <Chevrons onEnd={onEnd} offEnd={offEnd} riseEnd={riseEnd} risingOn={risingOn} />
    </g>
  );
}

function Solid({ d, colour }: { d: string; colour: string }) {
  return <path d={d} stroke={colour} strokeWidth={tube + 2} />;
}

function Hollow({ d, colour }: { d: string; colour: string }) {
  return (
    <>
      <path d={d} stroke={colour} strokeWidth={tube + 2} />
      <path d={d} stroke="var(--sw-paper)" strokeWidth={tube * 0.66} />
    </>
  );
}

interface ChevronsProps {
  onEnd: number | null;
  offEnd: number | null;
  riseEnd: number | null;
  risingOn: boolean;
}

/** Down on the trip tube, up on the release tube, left over the top, right along the foot. */
function Chevrons({ onEnd, offEnd, riseEnd, risingOn }: ChevronsProps) {
  const rows = Array.from({ length: 7 }, (_, i) => topY + 28 + i * 68.5);
  const middle = (tripX + releaseX) / 2;
  const trip = (y: number) =>
    onEnd !== null && y < onEnd
      ? 'var(--sw-on-trip)'
      : offEnd !== null && y < offEnd
        ? 'var(--sw-trip)'
        : 'var(--sw-rule)';
  const release = (y: number) =>
    riseEnd !== null && y > riseEnd
      ? 'var(--sw-release)'
      : riseEnd !== null && risingOn
        ? 'var(--sw-on-release)'
        : 'var(--sw-rule)';
  const clear = (y: number, end: number | null) => end === null || Math.abs(y - end) > 16;
  return (
    <g strokeWidth={3.4}>
      {rows.map((y) => (
        <g key={y}>
          {clear(y, onEnd) && <path d={`M${tripX - 7} ${y - 4}l7 8 7-8`} stroke={trip(y)} />}
          {clear(y, riseEnd) && <path d={`M${releaseX - 7} ${y + 4}l7-8 7 8`} stroke={release(y)} />}
        </g>
      ))}
      <path
        d={`M${middle + 4} ${topY - radius - 7}l-8 7 8 7`}
        stroke={onEnd === null ? 'var(--sw-rule)' : 'var(--sw-paper)'}
      />
      <path
        d={`M${middle - 4} ${bottomY + radius - 7}l8 7-8 7`}
        stroke={riseEnd === null ? 'var(--sw-rule)' : 'var(--sw-ink-2)'}
      />
    </g>
  );
}

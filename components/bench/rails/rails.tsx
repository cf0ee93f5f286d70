import { useTranslations } from 'next-intl';
import type { BenchReading, RailsView } from '@/lib/contracts/bench-view';
import type { ReadingStore } from '../live/reading-store';
import { useNumbers } from '../use-numbers';
import {
  hysteresisEnds,
  nothingInside,
  placeInside,
  type PlacedInside,
  type RailsInside,
} from '@/lib/rails/inside-blocks';
import { RailFlagShape } from './rail-flag';
import { railsBox, tubeEdge } from '@/lib/rails/rails-geometry';
import { RailsHeads } from './rails-heads';
import { RailsScale } from './rails-scale';
import { RailsTube } from './rails-tube';
import { SupplyDot } from './supply-dot';

interface RailsProps {
  rails: RailsView;
  readings: ReadingStore;
  inside?: RailsInside;
  /** The target between the jaws instead of the limits' numbers. */
  showsTarget?: boolean;
  /** A supply that is known to stand still, drawn instead of readings. */
  fixed?: BenchReading | null;
}

const middle = (railsBox.tripX + railsBox.releaseX) / 2;

/** Outside is printed, inside is measured: the two rails on one volt scale, read down on the left, up on the right. */
export function Rails({ rails, readings, inside = nothingInside, showsTarget = false, fixed = null }: RailsProps) {
  const t = useTranslations('bench.rails');
  const placed = placeInside(rails, inside);
  const target = { showsTarget: showsTarget && rails.targetVolts !== null, targetLabel: t('target') };
  return (
    <svg
      viewBox={`0 0 ${railsBox.width} ${railsBox.height}`}
      role="img"
      aria-label={useRailsText(rails)}
      className="block h-full w-full"
    >
      <RailsHeads />
      <RailsTube rails={rails} />
      <RailsScale rails={rails} side="trip" {...target} />
      <RailsScale rails={rails} side="release" showsTarget={false} targetLabel="" />
      <LoadWords rails={rails} inside={inside} placed={placed} />
      {placed.hysteresisY !== null && <Hysteresis rails={rails} placed={placed} y={placed.hysteresisY} />}
      {placed.flags.map((flag) => (
        <RailFlagShape key={flag.key} placed={flag} shiftVolts={inside.shiftVolts} />
      ))}
      {placed.heldY !== null && inside.heldVolts !== null && <Held y={placed.heldY} volts={inside.heldVolts} />}
      {inside.stoppedAtVolts !== null && <StoppedAt volts={inside.stoppedAtVolts} />}
      <SupplyDot rails={rails} readings={readings} fixed={fixed} />
    </svg>
  );
}

/** The rails in words, for those who hear the screen. */
function useRailsText(rails: RailsView): string {
  const t = useTranslations('bench.rails');
  const { volts } = useNumbers();
  const [release, trip] = hysteresisEnds(rails.flags) ?? [null, null];
  if (!release || !trip) return t('aria');
  return t('ariaFound', { trip: volts(trip.volts), release: volts(release.volts) });
}

function LoadWords({ rails, inside, placed }: { rails: RailsView; inside: RailsInside; placed: PlacedInside }) {
  const t = useTranslations('bench.rails');
  const { fallingOnToVolts, fallingOffToVolts, risingOffToVolts } = rails.travelled;
  const released = rails.flags.some((flag) => flag.side === 'release');
  const highest = Math.min(...placed.flags.map((flag) => flag.boxY), placed.heldY ?? Infinity);
  const lowest = Math.max(...placed.flags.map((flag) => flag.boxY), placed.heldY ?? 0);
  const beyond = lowest > railsBox.bottomY - 70;
  if (inside.boardAbsent)
    return (
      <text x={middle} y={400} textAnchor="middle" fontWeight={700} fontSize={32} fill="var(--sw-ink-2)">
        {t('noBoard')}
      </text>
    );
  return (
    <g textAnchor="middle" fontSize={30} fill="var(--sw-ink-2)">
      {fallingOnToVolts !== null && !released && highest > 220 && (
        <text x={middle} y={167} fontWeight={700}>
          {t('loadOn')}
        </text>
      )}
      {fallingOffToVolts !== null && risingOffToVolts === null && !beyond && (
        <text x={middle} y={railsBox.bottomY + 30} fontWeight={700}>
          {t('loadOff')}
        </text>
      )}
      {fallingOnToVolts !== null && risingOffToVolts === null && !released && highest > 320 && (
        <text x={railsBox.releaseX - tubeEdge - 6} y={281} textAnchor="end" fontSize={27}>
          {t('notYet')}
        </text>
      )}
    </g>
  );
}

function Held({ y, volts: held }: { y: number; volts: number }) {
  const t = useTranslations('bench.rails');
  const { volts } = useNumbers();
  return (
    <text x={264} y={y + 11} fontSize={29} fill="var(--sw-ink)">
      {t('held')}{' '}
      <tspan className="font-num" fontWeight={700} fontSize={33}>
        {volts(held)}
      </tspan>
    </text>
  );
}

function StoppedAt({ volts: stopped }: { volts: number }) {
  const t = useTranslations('bench.rails');
  const { volts } = useNumbers();
  return (
    <g textAnchor="middle">
      <text x={middle} y={418} fontSize={29} fill="var(--sw-ink-2)">
        {t('stoppedAt')}
      </text>
      <text x={middle} y={472} className="font-num" fontWeight={700} fontSize={40} fill="var(--sw-ink)">
        {`${volts(stopped)} V`}
      </text>
    </g>
  );
}

/** A dimension arrow between both flags; the arrow is left out where the number fills the room. */
function Hysteresis({ rails, placed, y }: { rails: RailsView; placed: PlacedInside; y: number }) {
  const t = useTranslations('bench.rails');
  const { volts } = useNumbers();
  const ends = hysteresisEnds(rails.flags)!;
  const [upper, lower] = ends.map((end) => placed.flags.find(({ flag }) => flag.side === end.side && !flag.hollow)!);
  const top = upper!.boxY + upper!.height / 2 + (upper!.flag.note && upper!.noteBelow ? 40 : 4);
  const between = placed.flags.some(({ boxY }) => boxY > upper!.boxY && boxY < lower!.boxY);
  const bottom = lower!.boxY - lower!.height / 2 - (lower!.flag.note && !lower!.noteBelow ? 40 : 4);
  return (
    <g fill="var(--sw-ink)">
      {!between && y - 34 - top > 16 && (
        <>
          <path d={`M${middle} ${top}V${y - 33}`} stroke="var(--sw-ink)" strokeWidth={2} />
          <path d={`M${middle - 7} ${top + 15}L${middle} ${top}l7 15z`} />
        </>
      )}
      {!between && bottom - y - 34 > 16 && (
        <>
          <path d={`M${middle} ${y + 36}V${bottom}`} stroke="var(--sw-ink)" strokeWidth={2} />
          <path d={`M${middle - 7} ${bottom - 15}L${middle} ${bottom}l7-15z`} />
        </>
      )}
      <text x={middle} y={y - 8} textAnchor="middle" fontSize={26} fill="var(--sw-ink-2)">
        {t('hysteresis')}
      </text>
      <text x={middle} y={y + 24} textAnchor="middle" className="font-num" fontWeight={700} fontSize={33}>
        {volts(rails.hysteresisVolts!)}
      </text>
    </g>
  );
}

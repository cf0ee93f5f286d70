import { useRef } from 'react';
import type { BenchReading, RailsView } from '@/lib/contracts/bench-view';
import type { ReadingStore } from '../live/reading-store';
import { useDisplayRate } from '../live/use-display-rate';
import { dotPosition } from '@/lib/rails/rails-geometry';

interface SupplyDotProps {
  rails: RailsView;
  readings: ReadingStore;
  /** Shown instead of readings: a held supply, or where a run stopped. */
  fixed: BenchReading | null;
}

/** The ringed dot of the live supply. It follows real readings at display rate, with no easing. */
export function SupplyDot({ rails, readings, fixed }: SupplyDotProps) {
  const dot = useRef<SVGGElement>(null);
  useDisplayRate(readings, (reading) => {
    const shown = reading ?? fixed;
    const at = fixed ? dotPosition(rails, fixed) : shown ? dotPosition(rails, shown) : null;
    dot.current?.setAttribute('transform', at ? `translate(${at.x.toFixed(1)} ${at.y.toFixed(1)})` : '');
    dot.current?.setAttribute('visibility', at ? 'visible' : 'hidden');
  });
  return (
    <g ref={dot} visibility="hidden" data-part="supply-dot">
      <circle r={22.5} fill="var(--sw-paper)" stroke="var(--sw-ink)" strokeWidth={6.5} />
      <circle r={7} fill="var(--sw-ink)" />
    </g>
  );
}

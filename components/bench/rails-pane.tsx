import type { BenchReading } from '@/lib/contracts/bench-view';
import { useBench } from './bench-context';
import { Rails } from './rails/rails';
import { nothingInside, type RailsInside } from '@/lib/rails/inside-blocks';
import { trimRails } from './trim/trim-inside';

interface RailsPaneProps {
  inside?: Partial<RailsInside>;
  showsTarget?: boolean;
  fixed?: BenchReading | null;
  /** False where the magnified strip carries the values. */
  flags?: boolean;
}

/** The rails of the run, or of the next run while none goes on; empty without a lot. Greyed when the connection is lost. */
export function RailsPane({ inside, showsTarget, fixed, flags = true }: RailsPaneProps) {
  const { view, readings, lost } = useBench();
  const known = view.run?.rails ?? view.next?.rails;
  if (!known) return null;
  const screen = view.run?.screen;
  const rails = screen?.kind === 'trim' ? trimRails(known, screen.trim) : known;
  return (
    <div className={`h-full ${lost ? 'opacity-40 grayscale' : ''}`}>
      <Rails
        rails={flags ? rails : { ...rails, flags: [], hysteresisVolts: null }}
        readings={readings}
        inside={{ ...nothingInside, ...inside }}
        showsTarget={showsTarget}
        fixed={fixed}
      />
    </div>
  );
}

import { useTranslations } from 'next-intl';
import type { TrimView } from '@/lib/trim/types';
import { useBench } from '../bench-context';
import { railsBox, heightOf } from '@/lib/rails/rails-geometry';
import { RailsPane } from '../rails-pane';
import { MagnifiedStrip } from '../strip/magnified-strip';
import { heldReading, isAfterBeep1 } from './trim-inside';

/** Rails and, beside them, the magnified strip, joined by a pale beam from its place on the rail. */
export function StripPane({ trim }: { trim: TrimView }) {
  const t = useTranslations('bench.strip');
  const { view } = useBench();
  const rails = view.run?.rails;
  if (!rails) return null;
  const y = heightOf(rails, trim.targetVolts);
  const volts = trim.liveTripVolts ?? trim.lastTripVolts;
  const live = trim.liveTripVolts !== null;
  const note = live ? t('now') : isAfterBeep1(rails, trim) ? t('afterBeep1') : t('before');
  return (
    <div className="relative flex h-full">
      <svg viewBox="0 0 1080 734" aria-hidden="true" className="absolute inset-0 h-full w-full max-[900px]:hidden">
        <path d={`M${railsBox.tripX + 12} ${y}L669 76V670Z`} fill="var(--sw-sheet)" />
      </svg>
      <div className="relative h-full w-166.75 flex-none max-[900px]:w-[60%]">
        <RailsPane showsTarget flags={false} fixed={heldReading(trim)} />
      </div>
      <div className="relative h-full min-w-0 flex-1">
        <MagnifiedStrip
          rails={rails}
          targetVolts={trim.targetVolts}
          toleranceVolts={trim.toleranceVolts}
          heldVolts={trim.heldVolts}
          trip={volts === null ? null : { volts, note, live }}
        />
      </div>
    </div>
  );
}

import type { RailsView } from '../contracts/bench-view';
import type { CertifiedBoard, CertifiedValue } from '../contracts/certificate';

const marginVolts = 1;
const half = (volts: number) => Math.round(volts * 2) / 2;

type Judged = CertifiedValue & { min: number; max: number };

/** The rails of a certified board, or null where the points or their limits were not measured. */
export function railsOfBoard({ values }: Pick<CertifiedBoard, 'values'>): RailsView | null {
  const of = (quantity: CertifiedValue['quantity']) =>
    values.find((value): value is Judged => value.quantity === quantity && value.min !== null && value.max !== null);
  const [trip, release] = [of('trip-volts'), of('release-volts')];
  if (!trip || !release) return null;
  const scaleMinVolts = half(trip.min - marginVolts);
  return {
    scaleMinVolts,
    scaleMaxVolts: half(release.max + marginVolts),
    tripLimits: { min: trip.min, max: trip.max },
    releaseLimits: { min: release.min, max: release.max },
    guardVolts: null,
    targetVolts: null,
    flags: [
      { side: 'trip', volts: trip.value, hollow: false, note: null },
      { side: 'release', volts: release.value, hollow: false, note: null },
    ],
    travelled: {
      fallingOnToVolts: trip.value,
      fallingOffToVolts: scaleMinVolts,
      risingOffToVolts: release.value,
      risingOn: true,
    },
    hysteresisVolts:
      values.find(({ quantity }) => quantity === 'hysteresis-volts')?.value ?? release.value - trip.value,
  };
}

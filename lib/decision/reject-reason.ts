import type { Measurement, RejectReason } from '../run/types';
import type { Finding } from './decide-verdict';

const units: Record<Measurement['quantity'], string> = {
  'contact-milliohms': 'mΩ',
  'reference-volts': 'V',
  'trip-volts': 'V',
  'release-volts': 'V',
  'hysteresis-volts': 'V',
  'trip-spread-volts': 'V',
  'output-high-drop-volts': 'V',
  'output-low-volts': 'V',
  'quiescent-amps': 'A',
  'ride-through-seconds': 's',
  'supply-amps': 'A',
  'operator-check': '',
  'channel-volts': 'V',
  'drift-volts': 'V',
};

const reasons: Record<Measurement['quantity'], { low: RejectReason; high: RejectReason }> = {
  /** A contact is the fixture's: a run that fails it ends without a verdict, so this row is never reached there. */
  'contact-milliohms': { low: 'point-not-steady', high: 'point-not-steady' },
  'reference-volts': { low: 'reference-out-of-limits', high: 'reference-out-of-limits' },
  'trip-volts': { low: 'trip-too-low', high: 'trip-too-high' },
  'release-volts': { low: 'release-too-low', high: 'release-too-high' },
  'hysteresis-volts': { low: 'hysteresis-too-small', high: 'hysteresis-too-large' },
  'trip-spread-volts': { low: 'not-repeatable', high: 'not-repeatable' },
  'output-high-drop-volts': { low: 'output-high-level', high: 'output-high-level' },
  'output-low-volts': { low: 'output-low-level', high: 'output-low-level' },
  'quiescent-amps': { low: 'quiescent-current', high: 'quiescent-current' },
  'ride-through-seconds': { low: 'ride-through', high: 'ride-through' },
  'supply-amps': { low: 'supply-current-at-limit', high: 'supply-current-at-limit' },
  'operator-check': { low: 'operator-check-failed', high: 'operator-check-failed' },
  'channel-volts': { low: 'channel-out-of-limits', high: 'channel-out-of-limits' },
  'drift-volts': { low: 'drift-too-large', high: 'drift-too-large' },
};

/** Why a board with this failed measurement is rejected, and what to show: the specification's limit, not the guarded one. */
export function reasonFor(failed: Measurement): { reason: RejectReason; measured: Finding } {
  const { min, max, guardedMin, value } = failed;
  const low = min !== null && (max === null || value < (guardedMin ?? min) || value - min < max - value);
  return {
    reason: reasons[failed.quantity][low ? 'low' : 'high'],
    measured: { value, unit: units[failed.quantity], limit: low ? min : max },
  };
}

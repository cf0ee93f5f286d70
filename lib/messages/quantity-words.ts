import type { Measurement } from '../run/types';

/** What measured quantities are called on desks and certificates, in English. */
export const quantityWords: Record<Measurement['quantity'], string> = {
  'contact-milliohms': 'Contact, milliohms',
  'reference-volts': 'Reference',
  'trip-volts': 'Trip',
  'release-volts': 'Release',
  'hysteresis-volts': 'Hysteresis',
  'trip-spread-volts': 'Trip spread',
  'output-high-drop-volts': 'High output, drop',
  'output-low-volts': 'Low output',
  'quiescent-amps': 'Quiescent current',
  'ride-through-seconds': 'Ride-through',
  'supply-amps': 'Supply current',
  'operator-check': 'Operator check',
  'channel-volts': 'Channel',
  'drift-volts': 'Drift',
};

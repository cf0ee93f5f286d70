import type { DispositionKind, LabelState, LotState } from '@/lib/contracts/stored-states';
import type { BoardStanding } from '@/lib/decision/board-standing';
import type { LikelyCause, Measurement, NoVerdictReason, RejectReason, Verdict } from '@/lib/run/types';

/** What desk pages call things. The bench has its own catalogue, in the operator's language. */

export const rejectWords: Record<RejectReason, string> = {
  'trip-too-low': 'Trip point too low',
  'trip-too-high': 'Trip point too high',
  'release-too-low': 'Release point too low',
  'release-too-high': 'Release point too high',
  'hysteresis-too-small': 'Hysteresis too small',
  'hysteresis-too-large': 'Hysteresis too large',
  'reference-out-of-limits': 'Reference out of limits',
  'supply-current-at-limit': 'Supply current at its limit',
  'never-on': 'Output never on',
  'never-off': 'Output never off',
  'output-chatters': 'Output chatters',
  'point-not-steady': 'Point not steady',
  'trim-no-effect': 'Trimmer has no effect',
  'trim-end-of-travel': 'End of trimmer travel',
  'trim-cannot-reach': 'Trim out of range',
  'trim-too-many-rounds': 'Too many trim rounds',
  'trim-will-not-turn': 'Trimmer will not turn',
  'not-repeatable': 'Points not repeatable',
  'output-high-level': 'High output too low',
  'output-low-level': 'Low output too high',
  'quiescent-current': 'Quiescent current too high',
  'ride-through': 'Drops out on interruption',
  'operator-check-failed': 'Operator check failed',
};

export const causeWords: Record<LikelyCause, string> = {
  'short-or-reversed-part': 'a short or a reversed part',
  'zener-open-or-reversed': 'the zener open or reversed',
  'zener-reversed': 'the zener reversed',
  'wrong-zener': 'a wrong zener',
  'feedback-open': 'the feedback resistor open or missing',
  'wrong-feedback-resistor': 'a wrong feedback resistor',
  'op-amp-missing-or-dead': 'the op-amp missing, unpowered or dead',
  'output-shorted': 'the output shorted, or feedback to the wrong pin',
  'trimmer-end-wiper-open-or-wrong-screw': 'the trimmer at its end, an open wiper or the wrong screw',
  'noisy-wiper-or-contact': 'a noisy wiper or worn contact',
  'reservoir-missing': 'the reservoir capacitor missing or open',
};

export const noVerdictWords: Record<NoVerdictReason, string> = {
  'operator-stop': 'Stopped by the operator',
  'supply-fault': 'Supply fault',
  'meter-fault': 'Meter fault',
  'fixture-fault': 'Fixture fault',
  'link-lost': 'Link lost',
  'lid-opened': 'Lid opened',
  'bench-lost': 'Bench screen lost',
  'contact-lost': 'Contact lost',
  'board-removed': 'Board taken out',
  'overvoltage-tripped': 'Overvoltage protection tripped',
  interrupted: 'Interrupted',
  shutdown: 'Station shut down',
};

export const verdictWords: Record<Verdict, string> = { pass: 'Passed', reject: 'Rejected', 'no-verdict': 'No verdict' };

export const quantityWords: Record<Measurement['quantity'], string> = {
  'contact-milliohms': 'Contact resistance',
  'reference-volts': 'Reference',
  'trip-volts': 'Trip',
  'release-volts': 'Release',
  'hysteresis-volts': 'Hysteresis',
  'trip-spread-volts': 'Trip, spread of repeats',
  'output-high-drop-volts': 'High output, below supply',
  'output-low-volts': 'Low output',
  'quiescent-amps': 'Quiescent current',
  'ride-through-seconds': 'Ride-through',
  'supply-amps': 'Supply current',
  'operator-check': 'Operator check',
};

export const standingWords: Record<BoardStanding['kind'], string> = {
  'may-be-tested': 'To be tested',
  'in-test': 'In test',
  passed: 'Passed',
  scrapped: 'Scrapped',
  returned: 'Returned',
  'used-as-is': 'Used as is',
  'needs-disposition': 'Needs a decision',
  'waits-for-quality': 'Waits for quality',
  'attempts-used': 'Attempts used',
};

export const lotStateWords: Record<LotState, string> = { open: 'Open', paused: 'Paused', closed: 'Closed' };

export const dispositionWords: Record<DispositionKind, string> = {
  rework: 'Rework',
  scrap: 'Scrap',
  concession: 'Use as is, by concession',
  return: 'Return to the supplier',
};

export const labelWords: Record<LabelState, string> = { waiting: 'waiting', printed: 'printed', failed: 'failed' };

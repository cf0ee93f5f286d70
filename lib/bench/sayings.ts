import type { Say } from '../contracts/bench-view';

/**
 * Every sentence that the station itself says on a bench screen (those of a run are in lib/run), with the names of
 * its parameters. `Say.code` is a key of this table; the catalogue of each language has a text for each. A parameter that
 * ends in `Iso` is an ISO time; `serial`, `lot`, `bin`, `station` are codes as printed.
 */
export const benchSayings = {
  // Starting and waiting
  'opening-instruments': [],
  'reopening-instruments': [],
  'switching-supply-off': [],
  'database-away': [],
  // Scans and commands, refused
  'not-now': [],
  'screen-watches': [],
  'not-permitted': [],
  'badge-unknown': [],
  'badge-not-for-bench': [],
  'pin-not-chosen': [],
  'wrong-pin': [],
  'too-many-tries': ['untilIso'],
  'sign-in-first': [],
  'end-shift-first': ['operator'],
  'lot-first': [],
  'offer-ended': [],
  'lot-unknown': ['lot'],
  'lot-not-open': ['lot'],
  'lot-paused': ['lot'],
  'lot-on-hold': ['lot'],
  'finish-board-first': ['serial'],
  'other-board': ['scanned', 'held'],
  'already-testing': ['serial'],
  'bin-first': ['bin'],
  'wrong-bin': ['scanned', 'bin'],
  'no-bin-needed': [],
  'empty-fixture-first': [],
  'serials-differ': [],
  'serial-wrong-form': ['serial'],
  'serial-unknown': ['serial'],
  'serial-of-other-lot': ['serial', 'lot'],
  'serial-not-in-lot': ['serial', 'lot'],
  'serial-of-other-type': ['serial', 'boardType'],
  'board-passed': ['serial', 'atIso'],
  'board-scrapped': ['serial'],
  'board-returned': ['serial'],
  'board-used-as-is': ['serial'],
  'board-needs-disposition': ['serial'],
  'board-failing-when-stopped': ['serial'],
  'board-three-without-verdict': ['serial'],
  'board-in-test': ['serial', 'station'],
  'attempts-used': ['serial', 'most'],
  'station-in-use': [],
  'sequence-not-released': ['boardType'],
  'sequence-withdrawn': ['revision', 'reason'],
  'needs-controller': [],
  'needs-wiper-probe': [],
  'sequence-has-errors': [],
  'instruments-away': [],
  'wrong-instrument': ['which'],
  'supply-not-confirmed-off': [],
  // Station panel and reasons why it may not test
  'meter-calibrated': [],
  'meter-calibration-soon': [],
  'meter-calibration-ended': [],
  'supply-calibrated': [],
  'supply-calibration-soon': [],
  'supply-calibration-ended': [],
  'not-calibrated': [],
  'daily-check-valid': [],
  'daily-check-soon': [],
  'daily-check-ended': [],
  'daily-check-missing': [],
  'daily-check-failed': [],
  commissioned: [],
  'commissioning-soon': [],
  'commissioning-ended': [],
  'commissioning-missing': [],
  'overshoot-outside-search': ['percent', 'minPercent', 'maxPercent'],
  trained: [],
  'training-soon': [],
  'training-ended': ['boardType'],
  'training-missing': ['boardType'],
  'links-answer': [],
  'supply-silent': [],
  'meter-silent': [],
  'controller-silent': [],
  'database-answers': [],
  // Commissioning
  'commissioning-scan-reference': [],
  'commissioning-seat': [],
  'reference-unknown': ['reference'],
  'commissioning-step': ['step'],
  'commissioning-done': [],
  'commissioning-stopped': [],
  'commissioning-failed': ['code'],
} as const satisfies Record<string, readonly string[]>;

export type BenchSaying = keyof typeof benchSayings;

type Params<C extends BenchSaying> = Record<(typeof benchSayings)[C][number], string | number>;

/** A sentence with all parameters that its text needs. */
export function say<C extends BenchSaying>(
  code: C,
  ...params: (typeof benchSayings)[C] extends readonly [] ? [] : [Params<C>]
): Say & { code: C } {
  return params[0] ? { code, params: { ...params[0] } } : { code };
}

/**
 * Every sentence of a run on a bench screen, with the names of its parameters; those of the station are in
 * lib/bench/sayings.ts. `Say.code` is a key of this table.
 */
export const runSayings = {
  // Measuring
  'run.contact-check': [],
  'run.power-up': [],
  'run.reference': [],
  'run.find-points': [],
  'run.find-again': [],
  'run.looking-closer': [],
  'run.verify': ['repeat', 'repeats'],
  'run.output-levels': [],
  'run.quiescent-current': [],
  'run.ride-through': [],
  'run.operator-check': [],
  'run.measure-channel': ['channel'],
  'run.apply-voltage': ['volts'],
  'run.soak': ['channel'],
  'run.switching-off': [],
  // Why there is no verdict
  'run.fault': ['detail'],
  'run.contact-open': [],
  'run.contact-too-high': ['ohms'],
  'run.board-removed': [],
  'run.supply-too-low': ['volts', 'wantedVolts'],
  'run.supply-not-confirmed-off': [],
  'run.no-controller': [],
  'run.no-wiper-probe': [],
  'run.pulse-too-short': ['milliseconds', 'wanted'],
  'run.incomplete': [],
} as const satisfies Record<`run.${string}`, readonly string[]>;

export type RunSaying = keyof typeof runSayings;

/**
 * The circuit of an undervoltage-cutoff board: comparator with hysteresis, zener reference, padded trimmer.
 * Nominal values of a board type, or the true values of one simulated board. Ohms, volts, amperes, farads.
 */
export interface BoardDesign {
  /** Zener fed from the supply through `feedOhms`; soft knee I = ratedAmps * exp((V - nominalVolts) / kneeVolts). */
  reference: { nominalVolts: number; ratedAmps: number; kneeVolts: number; feedOhms: number };
  /** `Rp`, end to end. */
  trimmerOhms: number;
  /** `Ra`, between the supply and the trimmer; 0 when absent. */
  supplyEndOhms: number;
  /** `Rb`, between the trimmer and ground; 0 when absent. */
  groundEndOhms: number;
  /** `Rf`, output to non-inverting input. */
  feedbackOhms: number;
  /** `Vd`: how far the high output stays below the supply. */
  outputDropVolts: number;
  /** `VOL`: the low output. */
  outputLowVolts: number;
  /** Load current drawn from the supply while the output is on, as a resistance from the supply to ground. */
  loadOhms: number;
  /** The board's own current without the load, at nominal supply. */
  quiescentAmps: number;
  reservoirFarads: number;
  /** Input offset of the comparator, added to the reference. Absent: none, as in every nominal design. */
  comparatorOffsetVolts?: number;
}

export interface TrimmerTravel {
  /** Electrical travel from end to end; 25 for a 25-turn part, 0.75 for a single-turn one of 270 degrees. */
  turns: number;
  clockwise: 'raises' | 'lowers';
  /** Dead travel after a reversal. */
  backlashTurns: number;
}

import type { BoardDesign, TrimmerTravel } from '@/lib/circuit/board-design';
import type { DefectKind } from '@/lib/contracts/bench-command';

/** What is true of one board, unknown to the station: part values, where the screw stands, what is wrong with it. */
export interface BoardTruth {
  design: BoardDesign;
  trimmer: TrimmerTravel;
  /** Turns from the anticlockwise end. */
  screwTurns: number;
  /** Where the screw stops; the whole travel on a sound board. */
  stops: { minTurns: number; maxTurns: number };
  /** Comparator noise at the supply terminals, one standard deviation, drawn afresh for every settle. */
  noiseVolts: number;
  /** Jumps of both points at rest, from a worn wiper; 0 on a sound board. */
  wiperJumpVolts: number;
  /** False where the screw no longer moves the wiper. */
  wiperFollows: boolean;
  /** `shorted`: stuck high. `dead`: never high, the op-amp draws nothing. */
  output: 'works' | 'shorted' | 'dead';
  zener: 'works' | 'open' | 'reversed';
  /** A short across the supply; null when there is none. */
  shortOhms: number | null;
  /** Contact resistance added by this board's pads. */
  padOhms: number;
  defect: DefectKind;
}

import { boardTypes } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import { predictSequence } from '@/lib/prediction/predict-sequence';
import { usualStation } from '@/lib/prediction/types';
import type { StationKind } from '@/lib/sequence/station-kind';
import { ScaledClock } from '@/stations/clock/scaled-clock';
import { atMost, type FigureRow, type FigureTarget } from '../figure';
import { mean, round } from '../statistics';
import { measureRun } from './measured-run';

const boardsMeasured = 20;
/** Benches at once: a real clock mostly waits, and a busy machine would be measured instead of the station. */
const atOnce = 5;
const mostOffPercent = 5;
/** One sequence of two beeps, one that is followed live. */
const measured = [sequences[0]!, sequences[1]!];

/**
 * Predicted against measured seconds a board, at the pace of the clock on the wall; timers that come late do not add up.
 * Only the station's part is held to the target.
 */
export async function predictionDuration(
  progress: (line: string) => void,
  share = 1,
): Promise<{ rows: FigureRow[]; targets: FigureTarget[] }> {
  const rows: FigureRow[] = [];
  const targets: FigureTarget[] = [];
  const station: StationKind = usualStation;
  for (const { name, boardTypeCode, sequence } of measured) {
    const boardType = boardTypes.find(({ code }) => code === boardTypeCode)!;
    const prediction = predictSequence(sequence, boardType, station);
    const predictedMs = prediction.totalMs - prediction.personMs;
    const boards = Math.max(atOnce, Math.round(boardsMeasured * share));
    const runs: Awaited<ReturnType<typeof measureRun>>[] = [];
    for (let from = 0; from < boards; from += atOnce) {
      const seeds = Array.from({ length: Math.min(atOnce, boards - from) }, (_, i) => 500 + from + i);
      runs.push(
        ...(await Promise.all(seeds.map((seed) => measureRun(sequence, boardType, station, seed, new ScaledClock(1))))),
      );
      progress(`${name}: ${runs.length} of ${boards} boards on the real clock`);
    }
    const stationMs = mean(runs.map((run) => run.stationMs));
    const offPercent = 100 * (predictedMs / stationMs - 1);
    rows.push({
      sequence: name,
      boards,
      passed: runs.filter(({ verdict }) => verdict === 'pass').length,
      'station s, predicted': round(predictedMs / 1000, 2),
      'station s, measured': round(stationMs / 1000, 2),
      'off %': round(offPercent, 1),
      'person s, predicted': round(prediction.personMs / 1000, 1),
      'person s, measured': round(mean(runs.map((run) => run.personMs)) / 1000, 1),
    });
    targets.push(atMost(`station time of ${name}, off by %`, round(Math.abs(offPercent), 2), mostOffPercent));
  }
  return { rows, targets };
}

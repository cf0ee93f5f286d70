import type { FigureRow } from '../figure';
import { mean, percentile, rootMeanSquare, round } from '../statistics';
import { classOf } from './population';
import type { SearchRow } from './rows';
import type { SearchedOne } from './search-worker';

/** Milliseconds of one settle and one waypoint, reading and bytes included. */
export interface CommandMs {
  settle: number;
  waypoint: number;
}

export interface RowSummary {
  meanSettles: number;
  rmsMillivolts: number;
  wrongBy5: number;
  wrongClass: number;
  columns: FigureRow;
}

const grossMillivolts = 5;

/** What a row shows of its boards: settles (the end check apart), seconds at two speeds, errors and wrong classes. */
export function summarise(row: SearchRow, boards: SearchedOne[], at9600: CommandMs, at115200: CommandMs): RowSummary {
  const settles = boards.map(({ found }) => found.settles);
  const seconds = (ms: CommandMs) =>
    mean(boards.map(({ commands }) => commands.settles * ms.settle + commands.waypoints * ms.waypoint)) / 1000;
  const errors = (point: 'trip' | 'release') =>
    boards.flatMap(({ board, found }) =>
      found[point] === null || board.stuck || found.kind === 'unresolved' ? [] : [(found[point] - board[point]) * 1e3],
    );
  const trip = errors('trip');
  const release = errors('release');
  const wrongBy5 = boards.filter(
    ({ board, found }) =>
      !board.stuck &&
      found.kind !== 'unresolved' &&
      (['trip', 'release'] as const).some(
        (point) => found[point] !== null && Math.abs(found[point] - board[point]) * 1e3 > grossMillivolts,
      ),
  ).length;
  const wrongClass = boards.filter(({ board, found }) => found.kind !== classOf(board)).length;
  const hasErrors = trip.length > 0;
  const rmsTrip = hasErrors ? rootMeanSquare(trip) : Number.NaN;
  const rmsRelease = hasErrors ? rootMeanSquare(release) : Number.NaN;
  const shown = (value: number) => (hasErrors ? round(value, 2) : null);
  return {
    meanSettles: mean(settles),
    rmsMillivolts: Math.max(rmsTrip, rmsRelease),
    wrongBy5,
    wrongClass,
    columns: {
      row: row.name,
      noise: row.noiseMillivolts,
      wanted: row.method === 'search' ? row.wantedMillivolts : null,
      boards: boards.length,
      mean: round(mean(settles), 1),
      p95: percentile(settles, 0.95),
      max: Math.max(...settles),
      check: round(mean(boards.map(({ found }) => found.endCheckSettles)), 1),
      's 9600': round(seconds(at9600), 2),
      's 115200': round(seconds(at115200), 2),
      'bias T': shown(hasErrors ? mean(trip) : 0),
      'bias R': shown(hasErrors ? mean(release) : 0),
      'RMS T': shown(rmsTrip),
      'RMS R': shown(rmsRelease),
      '>5 mV': wrongBy5,
      'wrong class': wrongClass,
    },
  };
}

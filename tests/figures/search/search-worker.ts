import type { SearchedBoard } from '../plant';
import { seededRandom } from '../random';
import { serveJobs } from '../serve-jobs';
import { type Found, methods } from './methods';
import { populations } from './population';
import type { SearchRow } from './rows';
import { settingsOf } from './settings';
import { type CommandTimes, StackPlant } from './stack-plant';

export interface SearchJob {
  row: SearchRow;
  seed: number;
  from: number;
  count: number;
  baudRate: 9600 | 115200;
}

export interface SearchedOne {
  board: SearchedBoard;
  found: Found;
  commands: { settles: number; waypoints: number };
}

export interface SearchAnswer {
  boards: SearchedOne[];
  times: CommandTimes;
}

/** Searches some boards of a row on one bench, whose offsets follow from the job's first board. */
async function performJob({ row, seed, from, count, baudRate }: SearchJob): Promise<SearchAnswer> {
  const settings = settingsOf(row);
  // A search that lets the supply peak above its maximum ends as a fault; the baselines know no such care.
  const spareVolts = row.method === 'search' ? 0 : 1;
  const plant = await StackPlant.open({
    seed: seed * 1000 + from,
    baudRate,
    overshoot: row.overshoot,
    supplyMinVolts: settings.supplyMinVolts,
    overvoltageVolts: settings.supplyMaxVolts + spareVolts,
  });
  const boards: SearchedOne[] = [];
  for (let i = from; i < from + count; i++) {
    const board = populations[row.population](seededRandom(seed * 100_003 + i * 7919));
    const start = await plant.seat(board, row.noiseMillivolts * 1e-3);
    const before = { settles: plant.times.settle.count, waypoints: plant.times.waypoint.count };
    const found = await methods[row.method](plant, settings, start);
    boards.push({
      board,
      found,
      commands: {
        settles: plant.times.settle.count - before.settles,
        waypoints: plant.times.waypoint.count - before.waypoints,
      },
    });
  }
  await plant.close();
  return { boards, times: plant.times };
}

serveJobs(performJob);

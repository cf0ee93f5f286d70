import { referenceAt } from '../../../lib/circuit/soft-knee';
import { paceOf } from '../../../lib/trim/pace';
import { seededRandom } from '../random';
import { serveJobs } from '../serve-jobs';
import { fixedSlope, secant } from './baselines';
import { fastLink, productTrim, runTrim, slowLink, type TrimRun } from './bench';
import { Hand } from './hand';
import { drawBoard, settingsFor, trimTypes } from './population';
import type { TrimRow } from './rows';

export interface TrimJob {
  row: TrimRow;
  seed: number;
  from: number;
  count: number;
}

/** Trims some boards of a row; every board has its own random numbers, the same for every procedure. */
async function performJob({ row, seed, from, count }: TrimJob): Promise<TrimRun[]> {
  return Array.from({ length: count }, (_, i) => trimOne(row, seed * 100_003 + (from + i) * 7919));
}

function trimOne(row: TrimRow, seed: number): TrimRun {
  const random = seededRandom(seed);
  const type = trimTypes[row.type];
  const link = row.link === '115200' ? fastLink : slowLink;
  const board = drawBoard(type, random);
  const settings = settingsFor(type, {
    procedure:
      row.procedure === 'two beeps' ? 'two-beeps' : row.procedure === 'wiper probe' ? 'wiper-probe' : 'prompted',
    toleranceVolts: row.toleranceMillivolts / 1000,
    pollMs: link.pollSeconds * 1000,
    fastLink: row.link === '115200',
  });
  if (row.procedure === 'prompted, 103 read') {
    const node = referenceAt(board.design.reference, board.tripVolts);
    if (node.kind === 'found') settings.referenceVolts = node.x + random.normal(0, 0.001);
  }
  const { voltsPerTurn } = paceOf(settings);
  const markTurns = (0.25 * settings.toleranceVolts) / voltsPerTurn;
  const habits = { ...type.hand, wrongWayShare: row.wrongWayShare };
  const hand = new Hand(habits, true, random, handMode(row), markTurns);
  if (row.procedure === 'fixed V/turn') return runTrim(fixedSlope, settings, board, hand, link, random);
  if (row.procedure === 'secant') return runTrim(secant, settings, board, hand, link, random);
  return runTrim(productTrim, settings, board, hand, link, random);
}

/** Eyes on the dial where it follows, else a turn as prompted, else until the beep. */
function handMode({ procedure, link }: TrimRow): 'beeps' | 'count' | 'dial' {
  if (procedure === 'two beeps') return 'beeps';
  if (procedure === 'wiper probe') return 'dial';
  return procedure.startsWith('prompted') && link === '115200' ? 'dial' : 'count';
}

serveJobs(performJob);

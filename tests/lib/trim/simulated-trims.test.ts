import { describe, expect, it } from 'vitest';
import { paceOf } from '../../../lib/trim/pace';
import type { TrimSettings } from '../../../lib/trim/types';
import { seededRandom } from '../../figures/random';
import { fastLink, productTrim, runTrim, slowLink, type Link } from '../../figures/trim/bench';
import { Hand } from '../../figures/trim/hand';
import { drawBoard, settingsFor, trimTypes, type TrimType } from '../../figures/trim/population';
import type { TrimmedBoard } from '../../figures/trim/trimmed-board';

interface Case {
  type?: TrimType;
  procedure: TrimSettings['procedure'];
  link?: Link;
  clockwise?: 'raises' | 'lowers';
  /** The screw of these boards works against their type. */
  reversedScrew?: boolean;
  wrongWayShare?: number;
  seed: number;
}

/** One board on the figure's bench: the hand turns while time passes, and the board answers. */
function trimOne(each: Case, change: (board: TrimmedBoard) => TrimmedBoard = (board) => board) {
  const random = seededRandom(each.seed);
  const { type = trimTypes.multi, link = fastLink, clockwise = 'raises' } = each;
  const board = change(drawBoard(type, random));
  const settings = settingsFor(type, {
    procedure: each.procedure,
    toleranceVolts: 0.02,
    pollMs: link.pollSeconds * 1000,
    fastLink: link === fastLink,
  });
  settings.trimmer = { ...settings.trimmer, clockwise };
  const mode =
    each.procedure === 'two-beeps' ? 'beeps' : each.procedure === 'prompted' && link === slowLink ? 'count' : 'dial';
  const habits = { ...type.hand, wrongWayShare: each.wrongWayShare ?? 0 };
  const mark = (0.25 * settings.toleranceVolts) / paceOf(settings).voltsPerTurn;
  const clockwiseRaises = (clockwise === 'raises') !== (each.reversedScrew ?? false);
  const hand = new Hand(habits, clockwiseRaises, random, mode, mark);
  return runTrim(productTrim, settings, board, hand, link, random);
}

const seeds = Array.from({ length: 12 }, (_, i) => 700 + i);

describe('a trim from prompt to outcome', () => {
  const cases: [string, Omit<Case, 'seed'>][] = [
    ['two beeps', { procedure: 'two-beeps' }],
    ['two beeps, 9,600 baud', { procedure: 'two-beeps', link: slowLink }],
    ['two beeps, padded single turn', { procedure: 'two-beeps', type: trimTypes.padded }],
    ['two beeps, clockwise lowers', { procedure: 'two-beeps', clockwise: 'lowers' }],
    ['two beeps, soft knee', { procedure: 'two-beeps', type: trimTypes.soft }],
    ['prompted and followed', { procedure: 'prompted' }],
    ['prompted, 9,600 baud', { procedure: 'prompted', link: slowLink }],
    ['prompted, 9,600 baud, clockwise lowers', { procedure: 'prompted', link: slowLink, clockwise: 'lowers' }],
    ['wiper probe', { procedure: 'wiper-probe' }],
    ['wiper probe, soft knee', { procedure: 'wiper-probe', type: trimTypes.soft }],
  ];
  it.each(cases)('%s: ends inside the tolerance', (_name, each) => {
    for (const seed of seeds) {
      const run = trimOne({ ...each, seed });
      expect(run.outcome, `seed ${seed}`).toMatchObject({ kind: 'trimmed' });
      expect(Math.abs(run.tripVolts - 10), `seed ${seed}`).toBeLessThan(0.024);
      expect(run.misjudged).toBe(false);
    }
  });

  it.each(['two-beeps', 'prompted', 'wiper-probe'] as const)(
    '%s: a hand that starts the wrong way is told and still gets there',
    (procedure) => {
      const runs = seeds.slice(0, 6).map((seed) => trimOne({ procedure, seed, wrongWayShare: 1 }));
      for (const run of runs) expect(run.outcome).toMatchObject({ kind: 'trimmed' });
      expect(runs.filter((run) => run.findings.includes('wrong-way')).length).toBeGreaterThanOrEqual(4);
    },
  );

  it.each(['two-beeps', 'wiper-probe'] as const)(
    '%s: a screw that works the other way round is found out',
    (procedure) => {
      for (const seed of seeds.slice(0, 6)) {
        const run = trimOne({ procedure, seed, reversedScrew: true });
        expect(run.outcome, `seed ${seed}`).toMatchObject({ kind: 'trimmed' });
      }
    },
  );

  it.each(['two-beeps', 'prompted', 'wiper-probe'] as const)(
    '%s: a screw that changes nothing is a finding',
    (procedure) => {
      for (const link of [fastLink, slowLink]) {
        const run = trimOne({ procedure, link, seed: 700 }, (board) => {
          board.turn = () => {};
          return board;
        });
        expect(run.outcome).toMatchObject({ kind: 'failed', finding: 'no-effect' });
        expect(run.findings).toContain('no-effect');
        expect(run.prompts).toBeLessThanOrEqual(2);
      }
    },
  );

  it.each(['two-beeps', 'prompted', 'wiper-probe'] as const)(
    '%s: a target beyond the end stop is a finding',
    (procedure) => {
      // Padded so that the last turn raises the trip point to 9.4 V or so of the 10 V wanted.
      const design = { ...trimTypes.padded.design, supplyEndOhms: 2820, groundEndOhms: 5980 };
      const type = { ...trimTypes.padded, design, startMinVolts: 8.8, startMaxVolts: 9 };
      for (const link of [fastLink, slowLink]) {
        const run = trimOne({ procedure, link, type, seed: 704 });
        expect(run.outcome, link.name).toMatchObject({ kind: 'failed', finding: 'end-of-travel' });
      }
    },
  );

  it('never takes a turning screw for a stopped one: no wrong way, no effect among good hands', () => {
    for (const procedure of ['two-beeps', 'prompted', 'wiper-probe'] as const) {
      for (const seed of seeds) expect(trimOne({ procedure, seed }).findings, `seed ${seed}`).toEqual([]);
    }
  });
});

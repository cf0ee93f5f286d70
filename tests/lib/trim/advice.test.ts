import { describe, expect, it } from 'vitest';
import { adviseTo, adviseTurns } from '../../../lib/trim/advice';
import { estimateBoard, observeTrip, turnedBy, turnsToEnd, voltsPerTurnOf } from '../../../lib/trim/board-estimate';
import { nodeAt, pointsAt } from '../../../lib/trim/board-model';
import { plainDesign, plainSettings, pointsOf } from './trim-fixtures';

const lucky = { ...plainSettings, referenceVolts: 5.6 };

describe('the estimate of a board', () => {
  it('takes the reference from channel 103, so that a board off its design gets the turns it needs', () => {
    const board = { ...plainDesign, reference: { ...plainDesign.reference, nominalVolts: 5.85 } };
    const found = pointsOf(board, 8.8);
    const blind = adviseTo(
      { settings: plainSettings, estimate: estimateBoard(plainSettings, found), reversed: false },
      10,
    );
    const settings = { ...plainSettings, referenceVolts: nodeAt(board, 8.8) };
    const told = adviseTo({ settings, estimate: estimateBoard(settings, found), reversed: false }, 10);
    const truth = adviseTo(
      {
        settings: { ...lucky, design: board },
        estimate: estimateBoard({ ...lucky, design: board, referenceVolts: nodeAt(board, 8.8) }, found),
        reversed: false,
      },
      10,
    );
    expect(Math.abs(told.turns - truth.turns)).toBeLessThan(0.01);
    expect(Math.abs(blind.turns - truth.turns)).toBeGreaterThan(0.04);
  });

  it('learns the reference from a turn and what it moved', () => {
    const board = { ...plainDesign, reference: { ...plainDesign.reference, nominalVolts: 5.85 } };
    const first = estimateBoard(plainSettings, pointsOf(board, 8.8));
    // 1.5 turns on this board, made exactly.
    const start = pointsOf(board, 8.8);
    const truth = estimateBoard({ ...lucky, design: board, referenceVolts: nodeAt(board, 8.8) }, start);
    const after = turnedBy(truth, { ...plainSettings, design: board }, 1.5);
    const settings = plainSettings;
    const moved = observeTrip(
      turnedBy(first, settings, 1.5),
      settings,
      pointsAt(board, after.mean[0]!).tripVolts,
      0.0008,
    );
    const error = (estimate: typeof first) => Math.abs(Math.exp(estimate.mean[1]!) * 5.6 - 5.85);
    expect(error(moved)).toBeLessThan(error(first));
    expect(moved.covariance[1]![1]!).toBeLessThan(first.covariance[1]![1]!);
  });

  it('gives the study’s 692 mV a turn at 10 V', () => {
    // Source: the trim study, reference 5.6 V, trimmer 10 k, feedback 100 k, drop 0.7 V: 692 mV a turn of 25.
    expect(voltsPerTurnOf(estimateBoard(lucky, pointsOf(plainDesign, 10)), lucky)).toBeCloseTo(0.692, 2);
  });
});

describe('advice', () => {
  const estimate = estimateBoard(lucky, pointsOf(plainDesign, 7));

  it('never asks for more than four turns at once, and says what cut it short', () => {
    expect(adviseTo({ settings: lucky, estimate, reversed: false }, 10)).toMatchObject({
      turns: 4,
      cutBy: 'most-at-once',
    });
  });

  it('stops at the end stop as estimated', () => {
    const near = { ...lucky, trimmer: { ...lucky.trimmer, turns: 4 } };
    const there = estimateBoard(near, pointsOf(plainDesign, 7));
    const left = turnsToEnd(there, near, false);
    expect(adviseTurns({ settings: near, estimate: there, reversed: false }, -3)).toMatchObject({
      turns: left,
      cutBy: 'end-stop',
      direction: 'anticlockwise',
    });
  });

  it('turns the other way where clockwise lowers, or where the screw was seen to be reversed', () => {
    const lowers = { ...lucky, trimmer: { ...lucky.trimmer, clockwise: 'lowers' as const } };
    expect(adviseTurns({ settings: lucky, estimate, reversed: false }, 1).direction).toBe('clockwise');
    expect(adviseTurns({ settings: lowers, estimate, reversed: false }, 1).direction).toBe('anticlockwise');
    expect(adviseTurns({ settings: lowers, estimate, reversed: true }, 1).direction).toBe('clockwise');
    expect(adviseTurns({ settings: lucky, estimate, reversed: false }, -1).direction).toBe('anticlockwise');
  });
});

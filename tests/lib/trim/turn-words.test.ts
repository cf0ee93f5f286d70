import { describe, expect, it } from 'vitest';
import { wordTurns } from '../../../lib/trim/turn-words';

describe('wordTurns', () => {
  it('names whole turns and eighths, to the nearest eighth, above half a turn', () => {
    expect(wordTurns(1.75, 0.69, 0.02)).toEqual({ unit: 'turns', whole: 1, eighths: 6 });
    expect(wordTurns(1.69, 0.69, 0.02)).toEqual({ unit: 'turns', whole: 1, eighths: 6 });
    expect(wordTurns(1.68, 0.69, 0.02)).toEqual({ unit: 'turns', whole: 1, eighths: 5 });
    expect(wordTurns(3.97, 0.69, 0.02)).toEqual({ unit: 'turns', whole: 4, eighths: 0 });
    expect(wordTurns(0.6, 0.69, 0.02)).toEqual({ unit: 'turns', whole: 0, eighths: 5 });
  });

  it('names degrees from half a turn down, also where the nearest eighth is half a turn', () => {
    expect(wordTurns(0.5, 0.69, 0.02)).toEqual({ unit: 'degrees', degrees: 180 });
    expect(wordTurns(0.52, 0.69, 0.02)).toEqual({ unit: 'degrees', degrees: 180 });
    expect(wordTurns(0.25, 0.69, 0.02)).toEqual({ unit: 'degrees', degrees: 90 });
  });

  it('rounds degrees to a step worth at most half the tolerance', () => {
    // 692 mV a turn is 1.92 mV a degree: half of 20 mV is 5.2 degrees, half of 5 mV 1.3.
    expect(wordTurns(33 / 360, 0.692, 0.02)).toEqual({ unit: 'degrees', degrees: 35 });
    expect(wordTurns(33 / 360, 0.692, 0.005)).toEqual({ unit: 'degrees', degrees: 33 });
    // 64 mV a degree: no hand turns finer than half a degree.
    expect(wordTurns(3.3 / 360, 23, 0.02)).toEqual({ unit: 'degrees', degrees: 3.5 });
  });

  it('never says zero degrees', () => {
    expect(wordTurns(0.0001, 0.692, 0.02)).toEqual({ unit: 'degrees', degrees: 5 });
  });
});

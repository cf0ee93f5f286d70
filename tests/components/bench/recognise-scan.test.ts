import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  idleRecogniser,
  patienceMs,
  takeCharacter,
  takeEnd,
  takeSilence,
  type Recognised,
} from '@/components/bench/scanner/recognise-scan';

interface Outcome {
  typed: string;
  scans: string[];
  enters: number;
}

/** Plays keys with the gaps before them; silences are noticed as the screen notices them. */
function play(keys: { key: string; gapMs: number }[]): Outcome {
  const outcome: Outcome = { typed: '', scans: [], enters: 0 };
  let state = idleRecogniser;
  let now = 1000;
  const take = (seen: Recognised) => {
    state = seen.state;
    outcome.typed += seen.typed;
    if (seen.scan !== null) outcome.scans.push(seen.scan);
    if (seen.enter) outcome.enters += 1;
  };
  for (const { key, gapMs } of keys) {
    now += gapMs;
    if (state.held && gapMs > patienceMs(state) + 5) take(takeSilence(state, now));
    take(key === 'Enter' ? takeEnd(state, now) : takeCharacter(state, key, now));
  }
  if (state.held) take(takeSilence(state, now + 500));
  return outcome;
}
const keys = (text: string, gapMs: number) => [...text].map((key) => ({ key, gapMs }));
const ended = (text: string, gapMs: number) => [...keys(text, gapMs), { key: 'Enter', gapMs }];

describe('telling a scanner from a hand', () => {
  it('reads a fast code that ends with Enter, and types nothing of it', () => {
    expect(play(ended('CB1210264800184', 8))).toEqual({ typed: '', scans: ['CB1210264800184'], enters: 0 });
  });

  it('reads a code of our own prefix from a slow scanner', () => {
    expect(play(ended('SWL-2648-B', 90))).toEqual({ typed: '', scans: ['SWL-2648-B'], enters: 0 });
  });

  it('reads a long code from a scanner that sends no end', () => {
    expect(play(keys('CB1210264800184', 10))).toEqual({ typed: '', scans: ['CB1210264800184'], enters: 0 });
  });

  it('lets a hand type, and its Enter be an Enter', () => {
    expect(play(ended('CB1210', 180))).toEqual({ typed: 'CB1210', scans: [], enters: 1 });
  });

  it('takes four quick digits for a PIN, not for a scan', () => {
    expect(play(ended('4711', 30))).toEqual({ typed: '4711', scans: [], enters: 1 });
  });

  it('gives back what a hand typed before a scan began', () => {
    expect(
      play([...keys('ab', 200), ...ended('SWN-R3', 9).map((k, i) => (i === 0 ? { ...k, gapMs: 400 } : k))]),
    ).toEqual({
      typed: 'ab',
      scans: ['SWN-R3'],
      enters: 0,
    });
  });

  it('loses no character of a hand and invents none', () => {
    const byHand = fc.array(
      fc.record({ key: fc.constantFrom(...'SWab12-'), gapMs: fc.integer({ min: 130, max: 600 }) }),
      {
        maxLength: 20,
      },
    );
    fc.assert(
      fc.property(byHand, (typed) => {
        expect(play(typed)).toEqual({ typed: typed.map(({ key }) => key).join(''), scans: [], enters: 0 });
      }),
    );
  });

  it('reads every code of five characters or more at scanner speed, whole', () => {
    fc.assert(
      fc.property(
        fc.string({ unit: fc.constantFrom(...'ABC0123456789-'), minLength: 5, maxLength: 40 }),
        fc.integer({ min: 0, max: 40 }),
        (code, gapMs) => {
          expect(play(ended(code, gapMs))).toEqual({ typed: '', scans: [code], enters: 0 });
        },
      ),
    );
  });
});

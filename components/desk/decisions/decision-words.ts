import type { DispositionKind } from '@/lib/contracts/stored-states';
import type { ConcessionSide } from '@/lib/decision/concession-sides';

interface DecisionWords {
  /** What a signature means, among the choices. */
  choice: string;
  followsOne: string;
  followsMany: string;
  /** The button. */
  verb: string;
  done: (boards: string) => string;
}

export const decisionWords: Record<DispositionKind, DecisionWords> = {
  rework: {
    choice: 'reworked, to be tested again',
    followsOne: 'It may be tested once more.',
    followsMany: 'They may be tested once more.',
    verb: 'Sign the rework',
    done: (boards) => `Rework of ${boards} recorded`,
  },
  scrap: {
    choice: 'scrap it',
    followsOne: 'It is never tested again.',
    followsMany: 'They are never tested again.',
    verb: 'Sign and scrap',
    done: (boards) => `Scrapped: ${boards}`,
  },
  concession: {
    choice: 'use it as it is, by concession',
    followsOne: 'It waits until the other side has signed too: quality and an engineer sign a concession.',
    followsMany: 'They wait until the other side has signed too: quality and an engineer sign a concession.',
    verb: 'Sign the concession',
    done: (boards) => `Concession for ${boards} waits for the second signature`,
  },
  return: {
    choice: 'return it to the supplier',
    followsOne: 'It leaves the lot and is not tested again.',
    followsMany: 'They leave the lot and are not tested again.',
    verb: 'Sign the return',
    done: (boards) => `Return of ${boards} recorded`,
  },
};

export const sideWords: Record<ConcessionSide, string> = { quality: 'quality', engineering: 'an engineer' };

/** Who still has to sign: the other side of whoever signed first. */
export function otherSideWords(sides: readonly ConcessionSide[]): string {
  if (sides.length !== 1) return 'somebody else of quality or engineering';
  return sides[0] === 'quality' ? sideWords.engineering : sideWords.quality;
}

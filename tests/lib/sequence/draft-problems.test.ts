import { describe, expect, it } from 'vitest';
import { cb1210 } from '@/db/seed/board-types';
import { blankKey, openDraft, ruleFactorKey } from '@/lib/sequence/draft';
import { freshStep, giveReason } from '@/lib/sequence/draft-edits';
import { errorsOf, submitBlocked, unreasoned } from '@/lib/sequence/draft-problems';
import { findingKey, type SequenceFinding } from '@/lib/sequence/finding';

const draft = openDraft({
  sequence: {
    steps: ['a', 'b'].map((id) => freshStep('power-up', id, cb1210)),
    decisionRule: { kind: 'guard-band', factor: 1 },
  },
  warningReasons: {},
});
const finding = (severity: SequenceFinding['severity'], stepId: string | null): SequenceFinding => ({
  problem: 'too-short',
  severity,
  stepId,
  field: 'settleMs',
  sentence: 'Too short.',
  mend: null,
});

describe('what keeps a draft from being submitted', () => {
  it('errors come in the order of the steps, texts that cannot be read among them, the whole sequence first', () => {
    const unread = { ...draft, unread: { [blankKey('a', 'volts')]: 'x', [ruleFactorKey]: 'y' } };
    const places = errorsOf(unread, [finding('error', 'b'), finding('warning', 'a'), finding('error', null)]);
    expect(places.map(({ stepId, field }) => `${stepId}/${field}`)).toEqual([
      'null/factor',
      'null/settleMs',
      'a/volts',
      'b/settleMs',
    ]);
  });

  it('a warning stands with a reason of five characters', () => {
    const warning = finding('warning', 'a');
    expect(unreasoned(draft, [warning])).toEqual([warning]);
    expect(unreasoned(giveReason(draft, findingKey(warning), 'ok  '), [warning])).toEqual([warning]);
    expect(unreasoned(giveReason(draft, findingKey(warning), 'as agreed'), [warning])).toEqual([]);
  });

  it.each([
    [{ conflicts: 1, errors: 2 }, '1 choice between two texts to make.'],
    [{ errors: 2, unreasoned: 1 }, 'Errors first.'],
    [{ unreasoned: 2 }, '2 warnings need a reason.'],
    [{ unsaved: true }, 'Not saved yet.'],
    [{}, null],
  ])('%o is told as %s', (state, words) => {
    expect(submitBlocked({ errors: 0, unreasoned: 0, conflicts: 0, unsaved: false, ...state })).toBe(words);
  });
});

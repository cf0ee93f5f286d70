import { describe, expect, it } from 'vitest';
import german from '@/lib/messages/de.json';
import english from '@/lib/messages/en.json';
import { runSayings } from '@/lib/run/sayings';
import { likelyCauses, noVerdictReasons, rejectReasons } from '@/lib/run/types';

describe.each([
  ['English', english],
  ['German', german],
])('the %s catalogue', (_language, catalogue) => {
  it('has a text for every sentence of a run, with no parameter that it is not given', () => {
    for (const [code, names] of Object.entries<readonly string[]>(runSayings)) {
      const text = (catalogue.say.run as Record<string, string>)[code.replace('run.', '')] ?? '';
      expect(text, code).not.toBe('');
      const used = [...text.matchAll(/\{(\w+)/g)].map((match) => match[1]!);
      expect(names, code).toEqual(expect.arrayContaining(used));
    }
  });
  it('has a text for every reject reason, likely cause and reason for no verdict', () => {
    for (const reason of rejectReasons) expect(catalogue.reject, reason).toHaveProperty([reason]);
    for (const cause of likelyCauses) expect(catalogue.cause, cause).toHaveProperty([cause]);
    for (const reason of noVerdictReasons) expect(catalogue.noVerdict, reason).toHaveProperty([reason]);
  });
});

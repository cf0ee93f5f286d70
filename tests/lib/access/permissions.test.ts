import { describe, expect, test } from 'vitest';
import { decideAccess } from '@/lib/access/access';
import { mayApprove } from '@/lib/access/actor';
import { mayDo, rights } from '@/lib/access/permissions';
import { roles } from '@/lib/access/roles';

describe('mayDo', () => {
  test('gives every right to someone', () => {
    for (const right of rights)
      expect(
        roles.some((role) => mayDo([role], right)),
        right,
      ).toBe(true);
  });

  test('gives an account without roles nothing', () => {
    for (const right of rights) expect(mayDo([], right), right).toBe(false);
  });

  test('lets the administrator sign, release, approve and test nothing', () => {
    const given = rights.filter((right) => mayDo(['administrator'], right));
    expect(given.sort()).toEqual(
      ['manage-accounts', 'manage-mail', 'manage-printers', 'manage-stations', 'manage-tokens'].sort(),
    );
  });

  test('keeps the operator at the bench', () => {
    expect(rights.filter((right) => mayDo(['operator'], right)).sort()).toEqual([
      'print-labels',
      'test-boards',
      'use-bench',
    ]);
  });

  test('gives release to another engineer or quality, and lots, holds and dispositions to quality alone', () => {
    const holders = (right: (typeof rights)[number]) => roles.filter((role) => mayDo([role], right));
    expect(holders('release-sequences')).toEqual(['test-engineer', 'quality-manager']);
    for (const right of ['manage-lots', 'hold-lots', 'sign-dispositions', 'order-retests', 'approve-limits'] as const)
      expect(holders(right), right).toEqual(['quality-manager']);
  });
});

test('nobody approves what they made, whatever roles they hold', () => {
  const everything = { accountId: 'a', roles };
  expect(mayApprove(everything, 'release-sequences', ['a'])).toBe(false);
  expect(mayApprove(everything, 'release-sequences', ['b', 'a'])).toBe(false);
  expect(mayApprove(everything, 'release-sequences', ['b'])).toBe(true);
  expect(mayApprove({ accountId: 'a', roles: ['operator'] }, 'release-sequences', ['b'])).toBe(false);
});

describe('decideAccess', () => {
  const nobody = { roles: null, enrolledBench: false };
  test('opens an enrolled bench browser its bench and nothing else', () => {
    const bench = { roles: null, enrolledBench: true };
    expect(decideAccess('bench', bench)).toBe('allowed');
    expect(decideAccess('enrolled-bench', bench)).toBe('allowed');
    expect(decideAccess('signed-in', bench)).toBe('sign-in');
    expect(decideAccess('manage-lots', bench)).toBe('sign-in');
  });

  test('lets a desk account watch a bench but not act there', () => {
    const desk = { roles: ['test-engineer'] as const, enrolledBench: false };
    expect(decideAccess('bench', desk)).toBe('allowed');
    expect(decideAccess('enrolled-bench', desk)).toBe('not-allowed');
  });

  test('asks nobody to sign in, and tells an account without the role that it may not', () => {
    expect(decideAccess('public', nobody)).toBe('allowed');
    expect(decideAccess('signed-in', nobody)).toBe('sign-in');
    expect(decideAccess('manage-lots', nobody)).toBe('sign-in');
    expect(decideAccess('manage-lots', { roles: ['operator'], enrolledBench: false })).toBe('not-allowed');
  });
});

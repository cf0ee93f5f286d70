import { expect, test } from 'vitest';
import { signInProblem } from '@/components/people/sign-in-problem';

const nowMs = Date.parse('2026-12-01T10:00:00Z');

test('says nothing about which of address and password is wrong', () => {
  expect(signInProblem('wrong-sign-in', nowMs)).toContain('do not belong together');
});

test.each([
  ['2026-12-01T10:00:04Z', 'Wait 4 seconds'],
  ['2026-12-01T09:59:00Z', 'Wait 1 second,'],
  ['2026-12-01T10:04:30Z', 'Wait 5 minutes'],
])('tells how long to wait for a try at %s', (retryAtIso, wanted) => {
  expect(signInProblem(`too-many-tries|${retryAtIso}`, nowMs)).toContain(wanted);
});

test('takes anything else for a server that did not answer', () => {
  for (const error of [null, '', 'CredentialsSignin', 'fetch failed'])
    expect(signInProblem(error, nowMs)).toContain('did not answer');
});

import { expect, test } from 'vitest';
import { accessOfRequest, listedTwice } from '@/lib/access/surface';

test('no page, handler, action or event is listed by two areas', () => {
  expect(listedTwice()).toEqual([]);
});

test('knows a request by its method and address, and nothing that is not listed', () => {
  expect(accessOfRequest('GET', '/sign-in')).toBe('public');
  expect(accessOfRequest('POST', '/api/auth/callback/desk')).toBe('public');
  expect(accessOfRequest('PUT', '/api/auth/callback/desk')).toBeNull();
  expect(accessOfRequest('GET', '/no-such-page')).toBeNull();
  expect(accessOfRequest('DELETE', '/sign-in')).toBeNull();
});

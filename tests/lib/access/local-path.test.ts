import { expect, test } from 'vitest';
import { localPath } from '@/lib/access/local-path';

test.each([
  ['/lots/2648-B?state=open', '/lots/2648-B?state=open'],
  ['/', '/'],
  [undefined, '/'],
  ['', '/'],
  ['lots', '/'],
  ['https://elsewhere.example/', '/'],
  ['//elsewhere.example/', '/'],
  ['/\\elsewhere.example/', '/'],
  ['/\t/elsewhere.example', '/'],
  ['javascript:alert(1)', '/'],
])('after signing in with next=%s one goes on to %s', (given, wanted) => {
  expect(localPath(given)).toBe(wanted);
});

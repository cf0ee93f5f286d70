import { expect, test } from 'vitest';
import { menuFor, startPageFor } from '@/lib/access/menu';
import { roles } from '@/lib/access/roles';
import { accessOfRequest } from '@/lib/access/surface';

const labels = (held: Parameters<typeof menuFor>[0]) => menuFor(held).map((item) => item.label);

test('the menu shows only pages that are listed and that the roles open', () => {
  expect(labels(['administrator'])).toContain('Administration');
  expect(labels(['quality-manager'])).not.toContain('Administration');
  expect(labels(['quality-manager'])).toContain('Lots');
  for (const role of roles)
    for (const { href } of menuFor([role])) expect(accessOfRequest('GET', href), href).not.toBeNull();
});

test('an administrator begins with the people, everyone else with the work', () => {
  expect(startPageFor(['administrator'])).toBe('/administration');
  expect(startPageFor(['quality-manager'])).toBe('/lots');
  expect(startPageFor(['administrator', 'quality-manager'])).toBe('/lots');
});

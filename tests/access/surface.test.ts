import { beforeAll, describe, expect, test } from 'vitest';
import { surface, type Surface } from '@/lib/access/surface';
import { findSurface, type FoundSurface } from './found-surface';

let found: FoundSurface;
beforeAll(() => {
  found = findSurface();
});

describe('everything that can be reached from outside', () => {
  test.each(['pages', 'handlers', 'actions', 'events'] as const)(
    '%s: each found is listed once and each listed is found',
    (part) => {
      const listed = Object.keys(surface[part satisfies keyof Surface]).sort();
      expect([...found[part]].sort()).toEqual(listed);
    },
  );

  test('server actions stand in files named actions.ts below app, and nowhere else', () => {
    expect(found.misplacedActions).toEqual([]);
  });

  test('the search for it finds something of every kind', () => {
    expect(found.pages.length).toBeGreaterThan(10);
    expect(found.handlers.length).toBeGreaterThan(1);
    expect(found.actions.length).toBeGreaterThan(10);
    expect(found.events.length).toBeGreaterThan(0);
  });
});

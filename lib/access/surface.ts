import type { Access } from './access';
import { benchSurface } from './surface/bench';
import { boardTypesSurface } from './surface/board-types';
import { certificatesSurface } from './surface/certificates';
import { decisionsSurface } from './surface/decisions';
import { dryRunsSurface } from './surface/dry-runs';
import { engineeringSurface } from './surface/engineering';
import { offersSurface } from './surface/offers';
import { peopleSurface } from './surface/people';
import { qualitySurface } from './surface/quality';
import { trailSurface } from './surface/trail';
import { sequencesSurface } from './surface/sequences';

/** One area's share of everything that can be reached from outside. A test fails for anything found but not listed, and the reverse. */
export interface Surface {
  /** Route of a page.tsx, without groups: `/people/[id]`. */
  pages: Record<string, Access>;
  /** Method and route of a route.ts: `GET /api/units/[serial]`. */
  handlers: Record<string, Access>;
  /** File and export of a server action: `app/(people)/people/actions.ts#addPerson`. */
  actions: Record<string, Access>;
  /** Name given to `socket.on` in server/live. */
  events: Record<string, Access>;
}

const areas: Surface[] = [
  peopleSurface,
  benchSurface,
  boardTypesSurface,
  engineeringSurface,
  dryRunsSurface,
  offersSurface,
  qualitySurface,
  decisionsSurface,
  certificatesSurface,
  trailSurface,
  sequencesSurface,
];

function merged(part: keyof Surface): Record<string, Access> {
  return Object.assign({}, ...areas.map((area) => area[part]));
}

export const surface: Surface = {
  pages: merged('pages'),
  handlers: merged('handlers'),
  actions: merged('actions'),
  events: merged('events'),
};

/** Keys listed by more than one area; the test wants none. */
export function listedTwice(): string[] {
  const keys = areas.flatMap((area) =>
    (Object.keys(area) as (keyof Surface)[]).flatMap((part) => Object.keys(area[part]).map((key) => `${part}: ${key}`)),
  );
  return keys.filter((key, i) => keys.indexOf(key) !== i);
}

/** A route with `[parts]` as a pattern for addresses; `[...rest]` takes one part or more. */
function patternOf(route: string): RegExp {
  const source = route
    .split('/')
    .map((part) =>
      /^\[\.\.\..+\]$/.test(part) ? '.+' : /^\[.+\]$/.test(part) ? '[^/]+' : part.replace(/[.*+?^${}()|\\]/g, '\\$&'),
    )
    .join('/');
  return new RegExp(`^${source}/?$`);
}

/** Routes without parameters before those with, so that /people/new is not taken for /people/[id]. */
const bySpecificity = (a: string, b: string) => a.split('[').length - b.split('[').length || b.length - a.length;

function patterns(keys: Record<string, Access>) {
  return Object.keys(keys)
    .sort(bySpecificity)
    .map((key) => ({
      access: keys[key]!,
      pattern: patternOf(key.replace(/^[A-Z]+ /, '')),
      method: /^[A-Z]+(?= )/.exec(key)?.[0],
    }));
}
const pagePatterns = patterns(surface.pages);
const handlerPatterns = patterns(surface.handlers);

/** Who may make this request, or null when nothing is listed there. A page takes POST too: that is how its actions are called. */
export function accessOfRequest(method: string, path: string): Access | null {
  const asked = method === 'HEAD' ? 'GET' : method;
  const handler = handlerPatterns.find((h) => h.method === asked && h.pattern.test(path));
  if (handler) return handler.access;
  if (asked !== 'GET' && asked !== 'POST') return null;
  return pagePatterns.find((page) => page.pattern.test(path))?.access ?? null;
}

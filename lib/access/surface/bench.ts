import type { Surface } from '../surface';

export const benchSurface: Surface = {
  pages: {
    '/bench': 'public',
    '/bench/[station]': 'bench',
  },
  handlers: {},
  actions: {
    'app/(bench)/bench/actions.ts#standAtDemoBench': 'public',
  },
  events: {
    'server/live/gateway.ts#command': 'enrolled-bench',
    'server/live/gateway.ts#hands': 'enrolled-bench',
  },
};

import type { Surface } from '../surface';

export const benchSurface: Surface = {
  pages: {},
  handlers: {},
  actions: {},
  events: {
    'server/live/gateway.ts#command': 'enrolled-bench',
    'server/live/gateway.ts#hands': 'enrolled-bench',
  },
};

import type { Surface } from '../surface';

export const engineeringSurface: Surface = {
  pages: {},
  handlers: {
    'GET /api/calls': 'signed-in',
  },
  actions: {
    'app/(engineering)/calls/actions.ts#acknowledgeCallAction': 'acknowledge-calls',
  },
  events: {},
};

import type { Surface } from '../surface';

export const trailSurface: Surface = {
  pages: { '/trail': 'read-trail' },
  handlers: {},
  actions: { 'app/(quality)/trail/actions.ts#verifyTrailAction': 'read-trail' },
  events: {},
};

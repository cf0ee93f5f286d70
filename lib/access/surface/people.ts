import type { Surface } from '../surface';

export const peopleSurface: Surface = {
  pages: {
    '/sign-in': 'public',
  },
  handlers: {
    'GET /api/auth/[...nextauth]': 'public',
    'POST /api/auth/[...nextauth]': 'public',
  },
  actions: {},
  events: {},
};

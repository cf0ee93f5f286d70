import type { Surface } from '../surface';

export const peopleSurface: Surface = {
  pages: {
    /** Sends an enrolled browser to its bench and a person to their start page. */
    '/': 'bench',
    '/sign-in': 'public',
    '/not-allowed': 'public',
  },
  handlers: {
    'GET /api/auth/[...nextauth]': 'public',
    'POST /api/auth/[...nextauth]': 'public',
    /** Says only whether the asking browser is signed in. */
    'GET /api/session': 'public',
  },
  actions: {},
  events: {},
};

import type { Surface } from '../surface';

/** Test sequences, their revisions and drafts. */
export const sequencesSurface: Surface = {
  pages: {},
  handlers: {
    'POST /api/drafts/[revision]/presence': 'edit-sequences',
  },
  actions: {},
  events: {},
};

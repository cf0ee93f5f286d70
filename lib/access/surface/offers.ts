import type { Surface } from '../surface';

/** Drafts tried on stations. */
export const offersSurface: Surface = {
  pages: {
    '/engineering-runs/[run]': 'signed-in',
  },
  handlers: {
    'GET /api/offers/[revision]': 'signed-in',
  },
  actions: {
    'app/(engineering)/sequences/offers/actions.ts#offerDraftAction': 'make-engineering-runs',
    'app/(engineering)/sequences/offers/actions.ts#endOfferAction': 'make-engineering-runs',
  },
  events: {},
};

import type { Surface } from '../surface';

const sequences = 'app/(engineering)/sequences/actions.ts';

/** Test sequences, their revisions and drafts. */
export const sequencesSurface: Surface = {
  pages: {
    '/sequences': 'signed-in',
    '/sequences/new': 'edit-sequences',
    '/sequences/[id]': 'signed-in',
    '/sequences/[id]/compare': 'signed-in',
    '/sequences/[id]/draft': 'signed-in',
  },
  handlers: {
    'POST /api/drafts/[revision]/presence': 'edit-sequences',
    'GET /api/sequences/[id]/export': 'signed-in',
    /** The published JSON Schema of sequence files. */
    'GET /api/sequences/schema': 'public',
  },
  actions: {
    [`${sequences}#newSequenceAction`]: 'edit-sequences',
    [`${sequences}#beginDraftAction`]: 'edit-sequences',
    [`${sequences}#discardDraftAction`]: 'edit-sequences',
    [`${sequences}#submitRevisionAction`]: 'edit-sequences',
    [`${sequences}#sendBackAction`]: 'release-sequences',
    [`${sequences}#releaseRevisionAction`]: 'release-sequences',
    [`${sequences}#withdrawRevisionAction`]: 'release-sequences',
    [`${sequences}#importSequenceAction`]: 'edit-sequences',
    'app/(engineering)/sequences/[id]/draft/actions.ts#saveDraftAction': 'edit-sequences',
    'app/(quality)/lots/actions.ts#moveLotAction': 'manage-lots',
  },
  events: {},
};

import type { Surface } from '../surface';

/** Board types, their revisions, and the files that belong to them. */
export const boardTypesSurface: Surface = {
  pages: {
    '/board-types': 'signed-in',
    '/board-types/new': 'edit-board-types',
    '/board-types/[code]': 'signed-in',
  },
  handlers: {
    'POST /api/files': 'edit-board-types',
    'GET /api/files/[id]': 'bench',
  },
  actions: {
    'app/(engineering)/board-types/actions.ts#newBoardTypeAction': 'edit-board-types',
    'app/(engineering)/board-types/actions.ts#beginDraftAction': 'edit-board-types',
    'app/(engineering)/board-types/actions.ts#saveDraftAction': 'edit-board-types',
    'app/(engineering)/board-types/actions.ts#discardDraftAction': 'edit-board-types',
    'app/(engineering)/board-types/actions.ts#askApprovalAction': 'edit-board-types',
    'app/(engineering)/board-types/actions.ts#takeBackAction': 'edit-board-types',
    'app/(engineering)/board-types/actions.ts#approveAction': 'approve-limits',
    'app/(engineering)/board-types/actions.ts#sendBackAction': 'approve-limits',
  },
  events: {},
};

import type { Surface } from '../surface';

/** Rejects, what is decided about them, the rules that hold lots, and the reasons that people choose from. */
export const decisionsSurface: Surface = {
  pages: {
    '/rejects': 'signed-in',
    '/reason-codes': 'manage-reason-codes',
    /** Every hold of a lot and the boards that are suspect, for print too. */
    '/lots/[code]/holds': 'signed-in',
    '/board-types/[code]/hold-rules': 'signed-in',
    /** Printed: what was decided about a board, with its signatures. */
    '/units/[serial]/decisions': 'signed-in',
  },
  handlers: { 'GET /api/rejects': 'signed-in' },
  actions: {
    /** Rework, scrap and return ask for quality as well; a concession may begin with an engineer. */
    'app/(quality)/units/actions.ts#signDispositionsAction': 'sign-concessions',
    'app/(quality)/units/actions.ts#completeConcessionAction': 'sign-concessions',
    'app/(quality)/board-types/[code]/hold-rules/actions.ts#setHoldRulesAction': 'approve-limits',
    'app/(quality)/reason-codes/actions.ts#addReasonCodeAction': 'manage-reason-codes',
    'app/(quality)/reason-codes/actions.ts#retireReasonCodeAction': 'manage-reason-codes',
    'app/(quality)/reason-codes/actions.ts#mergeReasonCodeAction': 'manage-reason-codes',
  },
  events: {},
};

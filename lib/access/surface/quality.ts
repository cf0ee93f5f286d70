import type { Surface } from '../surface';

export const qualitySurface: Surface = {
  pages: {
    '/lots': 'signed-in',
    '/lots/new': 'manage-lots',
    '/lots/[code]': 'signed-in',
    /** Printed for the bench, with the lot's barcode. */
    '/lots/[code]/sheet': 'signed-in',
    '/units': 'signed-in',
    '/units/[serial]': 'signed-in',
    '/search': 'signed-in',
  },
  handlers: {
    'GET /api/lots/[code]': 'signed-in',
    'GET /api/lots/[code]/review': 'signed-in',
    'GET /api/lots/[code]/baselines': 'manage-lots',
    'GET /api/units/[serial]': 'signed-in',
    /** All readings of a board as CSV. */
    'GET /api/units/[serial]/readings': 'signed-in',
  },
  actions: {
    'app/(quality)/lots/actions.ts#checkLotSerialsAction': 'manage-lots',
    'app/(quality)/lots/actions.ts#createLotAction': 'manage-lots',
    'app/(quality)/lots/actions.ts#changeLotAction': 'manage-lots',
    'app/(quality)/lots/actions.ts#holdLotAction': 'hold-lots',
    'app/(quality)/lots/actions.ts#releaseLotAction': 'hold-lots',
    'app/(quality)/lots/actions.ts#recordComponentBatchAction': 'manage-lots',
    'app/(quality)/lots/actions.ts#chooseBaselineAction': 'manage-lots',
    'app/(quality)/units/actions.ts#orderRetestAction': 'order-retests',
    'app/(quality)/units/actions.ts#printLabelAgainAction': 'print-labels',
  },
  events: {},
};

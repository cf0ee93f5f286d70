import type { Surface } from '../surface';

export const engineeringSurface: Surface = {
  pages: {
    '/stations': 'signed-in',
    '/stations/[code]': 'signed-in',
    '/instruments': 'signed-in',
    '/reference-boards': 'signed-in',
    '/training': 'signed-in',
  },
  handlers: {
    'GET /api/calls': 'signed-in',
    'GET /api/stations': 'signed-in',
    'GET /api/stations/[code]': 'signed-in',
  },
  actions: {
    'app/(engineering)/calls/actions.ts#acknowledgeCallAction': 'acknowledge-calls',
    'app/(engineering)/instruments/actions.ts#addInstrumentAction': 'manage-instruments',
    'app/(engineering)/instruments/actions.ts#changeInstrumentAction': 'manage-instruments',
    'app/(engineering)/instruments/actions.ts#recordCalibrationAction': 'manage-instruments',
    'app/(engineering)/reference-boards/actions.ts#addReferenceBoardAction': 'set-daily-check',
    'app/(engineering)/reference-boards/actions.ts#changeReferenceBoardAction': 'set-daily-check',
    'app/(engineering)/stations/actions.ts#recordDailyCheckAction': 'set-daily-check',
    'app/(engineering)/training/actions.ts#recordTrainingAction': 'record-training',
  },
  events: {},
};

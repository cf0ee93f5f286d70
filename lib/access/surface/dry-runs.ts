import type { Surface } from '../surface';

export const dryRunsSurface: Surface = {
  pages: { '/sequences/[id]/dry-runs/[run]': 'signed-in' },
  handlers: { 'GET /api/dry-runs/[id]': 'signed-in' },
  actions: {
    'app/(engineering)/sequences/dry-runs/actions.ts#askDryRunAction': 'edit-sequences',
    'app/(engineering)/sequences/dry-runs/actions.ts#cancelDryRunAction': 'edit-sequences',
    'app/(engineering)/sequences/dry-runs/actions.ts#keepDryRunAction': 'edit-sequences',
  },
  events: {},
};

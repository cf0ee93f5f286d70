import type { Surface } from '../surface';

export const benchSurface: Surface = {
  pages: {},
  handlers: {},
  actions: {},
  events: {},
};

import type { Surface } from '../surface';

export const qualitySurface: Surface = {
  pages: {},
  handlers: {},
  actions: {},
  events: {},
};

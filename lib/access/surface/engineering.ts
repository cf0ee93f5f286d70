import type { Surface } from '../surface';

export const engineeringSurface: Surface = {
  pages: {},
  handlers: {},
  actions: {},
  events: {},
};

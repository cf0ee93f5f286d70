import type { Figure } from './figure';
import { search } from './search';

/** Every figure, by the name the command takes. */
export const figures: readonly Figure[] = [search];

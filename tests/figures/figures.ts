import type { Figure } from './figure';
import { search } from './search';
import { trim } from './trim';

/** Every figure, by the name the command takes. */
export const figures: readonly Figure[] = [search, trim];

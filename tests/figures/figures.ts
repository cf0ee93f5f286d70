import type { Figure } from './figure';
import { dryRun } from './dry-run';
import { search } from './search';
import { trim } from './trim';

/** Every figure, by the name the command takes. */
export const figures: readonly Figure[] = [search, trim, dryRun];

import { endViews } from './end-views';
import type { GalleryView } from './samples';
import { shiftViews } from './shift-views';
import { trialViews } from './trial-views';
import { trimViews } from './trim-views';

/** Views of a bench as a station would send them, one for every screen. */
export const galleryViews: Record<string, GalleryView> = { ...shiftViews, ...trimViews, ...endViews, ...trialViews };

import type { Ref } from 'react';
import type { LotReview } from '@/lib/contracts/lot-review';

/** What every series of a lot that stands over its lot rule is given. `chosen`: place of the board told in words. */
export interface SeriesProps {
  review: LotReview;
  width: number;
  chosen: number | null;
  label: string;
  ref?: Ref<SVGSVGElement>;
}

import type { LotPage } from '@/lib/contracts/lot-page';
import type { LotView } from '@/lib/contracts/lot-view';
import type { Outcome } from '@/lib/contracts/outcome';
import type { Deciding } from '../decisions/deciding';
import type { LotActionsOf } from './lot-actions';

/** What every part of a lot's page is given. */
export interface LotSectionProps {
  lot: LotPage;
  view: LotView;
  changeView: (change: Partial<LotView>) => void;
  may: { manage: boolean; hold: boolean };
  actions: LotActionsOf & {
    recordBatch: (input: unknown) => Promise<Outcome>;
    chooseBaseline: (input: unknown) => Promise<Outcome>;
    move: (input: unknown) => Promise<Outcome>;
  };
  deciding: Deciding;
  /** Fetches the page again, after something was changed. */
  onChanged: () => void;
}

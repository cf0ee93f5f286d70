import type { BenchView, TrialOffer } from '@/lib/contracts/bench-view';
import { endViews } from './end-views';
import { base, idleLot, shown, type GalleryView } from './samples';
import { shiftViews } from './shift-views';
import { trimViews } from './trim-views';

export const trialOffer: TrialOffer = {
  offerId: '4b1d9c1e-7d0f-4e0a-9a52-6f3d1c8e2b11',
  offeredBy: 'T. Marsden',
  revision: 'r7',
  sequenceName: 'CB1210 cutoff trim',
  boardTypeCode: 'CB1210',
  note: 'Ten boards from the open tray, please. Watch whether the second beep comes too early.',
};

const inTrial = (view: BenchView): BenchView => ({ ...view, lot: null, label: null, engineering: trialOffer });
const trialOf = (shownView: GalleryView, change: Partial<BenchView> = {}): GalleryView => ({
  ...shownView,
  view: { ...inTrial(shownView.view), ...change },
});

/** A draft on offer, and the screens of its trial. */
export const trialViews: Record<string, GalleryView> = {
  'offer-idle': shown({ ...base, lot: idleLot, offer: trialOffer }),
  'offer-choose-lot': shown({
    ...base,
    lot: null,
    next: null,
    offer: trialOffer,
    screen: {
      kind: 'choose-lot',
      lots: [{ lotId: 'a', code: '2648-B', boardTypeCode: 'CB1210', size: 240, tested: 183 }],
    },
  }),
  'offer-watched': shown({ ...base, lot: idleLot, offer: { ...trialOffer, note: '' } }, { leads: false }),
  'trial-idle': shown(inTrial({ ...base, screen: { kind: 'idle', last: null } })),
  'trial-prompted': trialOf(trimViews['01-prompted-clockwise']!),
  'trial-first-beep': trialOf(trimViews['a1-first-beep']!),
  'trial-no-effect': trialOf(trimViews['a5-no-effect']!),
  'trial-flood': trialOf(trimViews['a2-flood']!),
  'trial-pass': trialOf(endViews['03-pass']!),
  'trial-reject': trialOf(endViews['04-reject']!, { screen: { kind: 'run' } }),
  'trial-fault': trialOf(endViews['05-fault']!),
  'trial-failing': trialOf(endViews['fault-not-confirmed']!),
  'trial-may-not-test': trialOf(shiftViews['b3-may-not-test']!),
};

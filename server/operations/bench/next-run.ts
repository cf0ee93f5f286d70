import type { OpenOffer } from '@/db/queries/engineering-offers';
import type { NextRun } from '@/lib/bench/types';
import type { TrialOffer } from '@/lib/contracts/bench-view';
import type { BoardType } from '@/lib/contracts/board-type';
import { printedRails } from '@/lib/run/rails';
import { groupsOf } from '@/lib/run/view';
import type { Sequence } from '@/lib/sequence/step';

/** What the next run of a lot or of an offered draft will be. */
export function nextRunOf({ boardType, sequence }: { boardType: BoardType; sequence: Sequence }): NextRun {
  return { stepGroups: groupsOf(sequence), rails: printedRails(boardType, sequence) };
}

/** An offer as the bench tells of it. */
export function trialOfferOf(offer: OpenOffer): TrialOffer {
  return {
    offerId: offer.id,
    offeredBy: offer.offeredByName,
    revision: `r${offer.revisionNumber}`,
    sequenceName: offer.sequenceName,
    boardTypeCode: offer.boardTypeCode,
    note: offer.note,
  };
}

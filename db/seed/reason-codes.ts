import type { Transaction } from '@/db/client';
import { reasonCodes } from '@/db/schema/reason-codes';
import type { ReasonCodeUse } from '@/lib/contracts/stored-states';
import { daysFrom } from './days';
import type { SeededPeople } from './people';

const words: Record<ReasonCodeUse, readonly string[]> = {
  rework: ['Part replaced', 'Solder joint reworked', 'Trimmer replaced'],
  scrap: ['Track or pad damaged', 'Rework costs more than the board', 'Attempts used up'],
  concession: ['Outside limits, accepted by the customer'],
  return: ['Wrong part fitted by the supplier', 'Supplier’s batch out of tolerance'],
  hold: ['Suspect component batch', 'Suspect fixture'],
  'hold-release': ['Cause found and removed', 'Boards measured again, all within limits'],
};

/** A handful of reasons to choose from, kept by quality. */
export async function seedReasonCodes(tx: Transaction, people: SeededPeople, now: Date): Promise<void> {
  const createdAt = daysFrom(now, -60);
  const rows = (Object.keys(words) as ReasonCodeUse[]).flatMap((use) =>
    words[use].map((word) => ({ use, word, createdBy: people.qualityId, createdAt })),
  );
  await tx.insert(reasonCodes).values(rows);
}

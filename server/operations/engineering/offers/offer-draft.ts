import { findOpenOffer, findRevisionToOffer, insertOffer, type OpenOffer } from '@/db/queries/engineering-offers';
import { listBenches, type BenchRow } from '@/db/queries/station-benches';
import { findCommissioning } from '@/db/queries/station-readiness';
import { insertTrail } from '@/db/queries/trail';
import type { Transaction } from '@/db/client';
import { isUniqueViolation } from '@/db/errors';
import type { Actor } from '@/lib/access/actor';
import { refusal, success, type Outcome, type Refusal } from '@/lib/contracts/outcome';
import type { offerDraftSchema } from '@/lib/contracts/sequence-draft';
import { linkHasController } from '@/lib/contracts/station-link';
import { checkSequence, missingEquipment } from '@/lib/sequence/check-sequence';
import type { Equipment } from '@/lib/steps/step-kind';
import { database } from '@/server/postgres';
import type { z } from 'zod';
import { stationKindOf } from '../station-kind';

type Revision = NonNullable<Awaited<ReturnType<typeof findRevisionToOffer>>>;

const equipmentWords: Record<Equipment, string> = {
  'fixture-controller': 'a fixture controller',
  'wiper-probe': 'a wiper probe',
};

/**
 * Offers a draft, as it is saved now, to a station: a bench may take it, nothing is started. Codes: revision-unknown,
 * not-a-draft, station-unknown, station-lacks-equipment, sequence-has-errors, station-has-offer.
 */
export async function offerDraft(
  actor: Actor,
  { revisionId, stationCode, note }: z.infer<typeof offerDraftSchema>,
): Promise<Outcome<{ offerId: string }>> {
  const bench = (await listBenches(database())).find(({ code }) => code === stationCode);
  if (!bench) return refusal('station-unknown', `There is no station ${stationCode} in use.`, 'stationCode');
  try {
    return await database().transaction(async (tx) => {
      const revision = await findRevisionToOffer(tx, revisionId);
      if (!revision) return refusal('revision-unknown', 'This draft does not exist. Open the sequence again.');
      const refused = await refuse(tx, revision, bench);
      if (refused) return refused;
      const { id: offerId } = await insertOffer(tx, {
        stationId: bench.id,
        revisionId,
        boardTypeId: revision.boardTypeId,
        sequence: revision.sequence,
        boardType: revision.boardType,
        note,
        offeredBy: actor.accountId,
      });
      const { number, version } = revision;
      await insertTrail(tx, actor, {
        action: 'offer.made',
        entity: 'engineering-offer',
        entityId: offerId,
        after: { station: bench.code, revisionId, revision: `r${number}`, version, note },
      });
      return success({ offerId });
    });
  } catch (error) {
    if (!isUniqueViolation(error, 'engineering_offers_one_open')) throw error;
    return hasOffer(bench, (await findOpenOffer(database(), bench.id))!);
  }
}

async function refuse(tx: Transaction, revision: Revision, bench: BenchRow): Promise<Refusal | null> {
  const { sequence, boardType, status, number } = revision;
  if (status !== 'draft' && status !== 'submitted')
    return refusal('not-a-draft', `r${number} is ${status}. Only a draft is tried; begin a new one from it.`);
  const open = await findOpenOffer(tx, bench.id);
  if (open) return hasOffer(bench, open);
  const equipment = { hasController: linkHasController(bench.link), hasWiperProbe: bench.hasWiperProbe };
  const missing = missingEquipment(sequence, equipment);
  if (missing.length > 0) {
    const words = missing.map((each) => equipmentWords[each]).join(' and ');
    return refusal('station-lacks-equipment', `The draft needs ${words}. ${bench.name} has none.`, 'stationCode');
  }
  const measured = await findCommissioning(tx, bench.id);
  const findings = checkSequence(sequence, boardType, measured ? stationKindOf(bench, measured) : undefined);
  const [first, ...more] = findings.filter(({ severity }) => severity === 'error');
  if (!first) return null;
  const others = more.length === 0 ? '' : ` ${more.length} more ${more.length === 1 ? 'error' : 'errors'} as well.`;
  return refusal('sequence-has-errors', `The draft cannot run on ${bench.name}. ${first.sentence}${others}`);
}

function hasOffer({ name }: BenchRow, { revisionNumber, sequenceName, offeredByName }: OpenOffer): Refusal {
  return refusal(
    'station-has-offer',
    `${name} has r${revisionNumber} of ${sequenceName} on offer from ${offeredByName}. End that offer first.`,
    'stationCode',
  );
}

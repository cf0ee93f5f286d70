import { isUniqueViolation } from '@/db/errors';
import { insertLot } from '@/db/queries/lots';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { CreateLot } from '@/lib/contracts/lot';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';
import { readSerials } from './read-serials';

/**
 * Makes a lot with its boards, all or nothing. Codes: sequence-not-released, serials-unreadable, serials-bad, lot-exists,
 * serial-taken.
 */
export async function createLot(actor: Actor, input: CreateLot): Promise<Outcome<{ code: string; size: number }>> {
  try {
    return await database().transaction(async (tx) => {
      const read = await readSerials(tx, input.sequenceRevisionId, input.serials);
      if (!read.ok) return read;
      const { basis, rows } = read.value;
      const bad = rows.filter((row) => row.problem !== null);
      const leftOut = input.serials.kind === 'listed' && input.serials.leaveOutBad;
      const good = rows.filter((row) => row.problem === null).map((row) => row.serial);
      if (bad.length > 0 && !leftOut)
        return refusal(
          'serials-bad',
          `${bad.length} of ${rows.length} serial numbers cannot be stored. ${rows.length === 1 ? bad[0]!.problem : `Line ${bad[0]!.line}: ${bad[0]!.problem}`}`,
          input.serials.kind === 'counted' ? 'serials.firstSerial' : 'serials.text',
        );
      if (good.length === 0) return refusal('serials-bad', 'No serial number can be stored.', 'serials.text');
      const lot = await insertLot(
        tx,
        {
          code: input.code,
          boardTypeRevisionId: basis.boardTypeRevisionId,
          sequenceRevisionId: basis.sequenceRevisionId,
          size: good.length,
          createdBy: actor.accountId,
        },
        good,
      );
      await insertTrail(tx, actor, {
        action: 'lot.created',
        entity: 'lot',
        entityId: lot.id,
        after: {
          code: lot.code,
          boardType: basis.boardTypeCode,
          sequence: `r${basis.sequenceNumber}`,
          size: lot.size,
          firstSerial: good[0],
          lastSerial: good.at(-1),
          leftOut: bad.length,
        },
      });
      return success({ code: lot.code, size: lot.size });
    });
  } catch (error) {
    if (isUniqueViolation(error, 'lots_code_unique'))
      return refusal('lot-exists', `Lot ${input.code} exists. Choose another number.`, 'code');
    // Someone stored the same serial between the check and the insert.
    if (isUniqueViolation(error, 'units_serial_unique'))
      return refusal('serial-taken', 'One of these serial numbers was stored a moment ago. Check them again.');
    throw error;
  }
}

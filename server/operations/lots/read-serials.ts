import type { Database, Transaction } from '@/db/client';
import { listLotBases, listLotsOfSerials, type LotBasis } from '@/db/queries/lots';
import type { LotSerials } from '@/lib/contracts/lot';
import { checkSerials, countUpSerials, readSerialFile, type SerialRow } from '@/lib/contracts/lot-serials';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';

/**
 * The boards of a lot to be, each with what is wrong with it. Codes: sequence-not-released, serials-unreadable.
 */
export async function readSerials(
  db: Database | Transaction,
  sequenceRevisionId: string,
  serials: LotSerials,
): Promise<Outcome<{ basis: LotBasis; rows: SerialRow[] }>> {
  const bases = await listLotBases(db);
  const basis = bases.find((candidate) => candidate.sequenceRevisionId === sequenceRevisionId);
  if (!basis)
    return refusal('sequence-not-released', 'This sequence is not released. Choose another one.', 'sequenceRevisionId');
  const list =
    serials.kind === 'counted' ? countUpSerials(serials.firstSerial, serials.quantity) : readSerialFile(serials.text);
  if (!list.ok)
    return refusal(
      'serials-unreadable',
      list.sentence,
      serials.kind === 'counted' ? 'serials.firstSerial' : 'serials.text',
    );
  const lotOf = await listLotsOfSerials(
    db,
    list.rows.map((row) => row.serial),
  );
  const rows = checkSerials(list.rows, { pattern: basis.serialPattern, boardTypeCode: basis.boardTypeCode, lotOf });
  return success({ basis, rows });
}

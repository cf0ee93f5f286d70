import type { z } from 'zod';
import type { checkLotSerialsSchema } from '@/lib/contracts/lot';
import type { SerialRow } from '@/lib/contracts/lot-serials';
import { success, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';
import { readSerials } from './read-serials';

/** What would be stored, with an error beside each bad row. Stores nothing. */
export async function checkLotSerials(input: z.infer<typeof checkLotSerialsSchema>): Promise<Outcome<SerialRow[]>> {
  const read = await readSerials(database(), input.sequenceRevisionId, input.serials);
  return read.ok ? success(read.value.rows) : read;
}

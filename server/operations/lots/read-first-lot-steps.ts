import { listLotBases, type LotBasis } from '@/db/queries/lots';
import { findLotPreparation } from '@/db/queries/lots-preparation';
import { database } from '@/server/postgres';

/** What stands between a new installation and its first lot; each null when missing. */
export interface FirstLotSteps {
  anyLot: boolean;
  /** Code of a board type with approved limits. */
  boardType: string | null;
  /** A released sequence with its board type. */
  sequence: Pick<LotBasis, 'boardTypeCode' | 'sequenceNumber'> | null;
  /** Code of a station with a commissioning that holds. */
  station: string | null;
}

export async function readFirstLotSteps(): Promise<FirstLotSteps> {
  const db = database();
  const [found, [sequence]] = await Promise.all([findLotPreparation(db), listLotBases(db)]);
  return { ...found, sequence: sequence ?? null };
}

import { findUnit, searchLots, searchUnits, type FoundLot, type FoundUnit } from '@/db/queries/units';
import { findLotByCode } from '@/db/queries/lots';
import { readScan } from '@/lib/bench/scan-code';
import { database } from '@/server/postgres';

const most = 50;

export interface SearchResult {
  /** What was looked for, as it is kept. */
  text: string;
  /** Where an exact serial or lot leads. */
  exact: { kind: 'unit'; serial: string } | { kind: 'lot'; code: string } | null;
  units: FoundUnit[];
  lots: FoundLot[];
  /** There are more than are listed. */
  more: boolean;
}

/** Boards and lots by a part of their number, or by the code that a scanner reads. */
export async function searchEverywhere(entered: string): Promise<SearchResult> {
  const scanned = readScan(entered);
  const text = (scanned.kind === 'lot' ? scanned.short : entered.trim().toUpperCase()).replace(/\s+/g, '');
  const nothing: SearchResult = { text, exact: null, units: [], lots: [], more: false };
  if (text === '') return nothing;
  const db = database();
  if (scanned.kind !== 'lot') {
    const unit = await findUnit(db, text);
    if (unit) return { ...nothing, exact: { kind: 'unit', serial: unit.serial } };
  }
  const lot = await findLotByCode(db, text);
  if (lot) return { ...nothing, exact: { kind: 'lot', code: lot.code } };
  const [units, lots] = await Promise.all([searchUnits(db, text, most + 1), searchLots(db, text, most + 1)]);
  return {
    ...nothing,
    units: units.slice(0, most),
    lots: lots.slice(0, most),
    more: units.length > most || lots.length > most,
  };
}

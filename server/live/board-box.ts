import { createHash } from 'node:crypto';
import type { Database } from '@/db/client';
import { findOpenOffer, listRunsOfOffers } from '@/db/queries/engineering-offers';
import { findSimulatedBoard, listOpenLotsOfType } from '@/db/queries/station-boxes';
import { findReferenceBoard } from '@/db/queries/station-references';
import { listUnitRecordsOfLot } from '@/db/queries/unit-records';
import type { BenchPlace } from '@/lib/bench/types';
import { boardStanding } from '@/lib/decision/board-standing';
import type { BoardBox, BoardOrder } from '@/stations/simulation/simulated-hands';

/** The box of boards beside a simulated bench: those of its lot, or in a trial those of the type, and the reference boards. */
export function boardBox(
  db: Database,
  stationId: string,
  place: () => Pick<BenchPlace, 'lotId' | 'offerId'>,
): BoardBox {
  const trialNow = async () => {
    const offer = place().offerId ? await findOpenOffer(db, stationId) : null;
    return offer?.id === place().offerId ? offer : null;
  };
  return {
    async nextSerial() {
      const { lotId } = place();
      const trial = await trialNow();
      if (!trial) return lotId ? findUntested(db, lotId) : null;
      const tried = new Set((await listRunsOfOffers(db, [trial.id])).map(({ serial }) => serial));
      const lots = await listOpenLotsOfType(db, trial.boardTypeId);
      for (const lot of lots.sort((a, b) => Number(b === lotId) - Number(a === lotId))) {
        const serial = await findUntested(db, lot, tried);
        if (serial) return serial;
      }
      return null;
    },
    async orderOf(serial): Promise<BoardOrder | null> {
      const drawn = await findSimulatedBoard(db, serial);
      if (drawn) {
        const { boardType, sequence } = drawn;
        const trim = sequence.steps.find((step) => step.kind === 'trim');
        return {
          kind: 'drawn',
          boardType,
          seed: drawn.seed ?? seedOf(serial),
          defect: drawn.defect ?? 'none',
          ...(trim?.kind === 'trim' && { targetVolts: trim.targetVolts }),
        };
      }
      const reference = await findReferenceBoard(db, serial);
      if (reference) {
        const { tripVolts, releaseVolts } = reference.board;
        return { kind: 'reference', boardType: reference.boardType, points: { tripVolts, releaseVolts } };
      }
      // A trial takes spare boards that belong to no lot.
      const trial = await trialNow();
      if (!trial || !new RegExp(trial.boardType.serialPattern).test(serial)) return null;
      return { kind: 'drawn', boardType: trial.boardType, seed: seedOf(serial), defect: 'none' };
    },
  };
}

async function findUntested(db: Database, lotId: string, besides?: ReadonlySet<string>): Promise<string | null> {
  const records = await listUnitRecordsOfLot(db, lotId);
  const next = records.find((record) => boardStanding(record).kind === 'may-be-tested' && !besides?.has(record.serial));
  return next?.serial ?? null;
}

function seedOf(serial: string): number {
  return createHash('sha256').update(serial).digest().readUInt32BE();
}

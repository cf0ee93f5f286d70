import { createHash } from 'node:crypto';
import type { Database } from '@/db/client';
import { findSimulatedBoard } from '@/db/queries/station-boxes';
import { findReferenceBoard } from '@/db/queries/station-references';
import { listUnitRecordsOfLot } from '@/db/queries/unit-records';
import { boardStanding } from '@/lib/decision/board-standing';
import type { BoardBox, BoardOrder } from '@/stations/simulation/simulated-hands';

/** The box of boards beside a simulated bench: those of its lot, and the reference boards. */
export function boardBox(db: Database, lotId: () => string | null): BoardBox {
  return {
    async nextSerial() {
      const lot = lotId();
      const records = lot ? await listUnitRecordsOfLot(db, lot) : [];
      return records.find((record) => boardStanding(record).kind === 'may-be-tested')?.serial ?? null;
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
      if (!reference) return null;
      const { tripVolts, releaseVolts } = reference.board;
      return { kind: 'reference', boardType: reference.boardType, points: { tripVolts, releaseVolts } };
    },
  };
}

function seedOf(serial: string): number {
  return createHash('sha256').update(serial).digest().readUInt32BE();
}

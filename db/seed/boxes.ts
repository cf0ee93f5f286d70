import type { Transaction } from '@/db/client';
import { lotComponents } from '@/db/schema/lot-components';
import { lots } from '@/db/schema/lots';
import { simulatedBoards } from '@/db/schema/simulated-boards';
import { units } from '@/db/schema/units';
import type { DefectKind } from '@/lib/contracts/bench-command';
import { cb0612, cb1210, cb2420 } from './board-types';
import { daysFrom, yearAndWeek } from './days';
import type { SeededPeople } from './people';
import type { SeededProducts } from './products';

interface DemoLot {
  /** After year and week, such as 01. */
  number: string;
  boardTypeCode: string;
  sequenceName: string;
  size: number;
  firstNumber: number;
  /** By place in the lot, from 1. Other boards are sound. */
  defects: Record<number, DefectKind>;
}

const demoLots: readonly DemoLot[] = [
  {
    number: '01',
    boardTypeCode: cb1210.code,
    sequenceName: 'CB1210 cutoff trim',
    size: 24,
    firstNumber: 161,
    defects: {
      3: 'feedback-open',
      6: 'wrong-zener',
      10: 'reservoir-missing',
      13: 'op-amp-missing',
      17: 'wiper-open',
      20: 'supply-short',
      23: 'zener-open',
    },
  },
  {
    number: '02',
    boardTypeCode: cb1210.code,
    sequenceName: 'CB1210 cutoff trim',
    size: 240,
    firstNumber: 201,
    defects: {
      19: 'wrong-feedback',
      47: 'noisy-wiper',
      88: 'output-shorted',
      131: 'trimmer-at-end',
      176: 'zener-reversed',
      219: 'feedback-open',
    },
  },
  {
    number: '03',
    boardTypeCode: cb2420.code,
    sequenceName: 'CB2420 cutoff trim',
    size: 48,
    firstNumber: 41,
    defects: { 8: 'wrong-zener', 29: 'reservoir-missing' },
  },
  {
    number: '04',
    boardTypeCode: cb0612.code,
    sequenceName: 'CB0612 cutoff trim',
    size: 36,
    firstNumber: 11,
    defects: { 5: 'wiper-open', 22: 'feedback-open' },
  },
  {
    number: '05',
    boardTypeCode: cb0612.code,
    sequenceName: 'CB0612 cutoff trim, wiper probe',
    size: 24,
    firstNumber: 51,
    defects: { 9: 'op-amp-missing' },
  },
  {
    number: '06',
    boardTypeCode: cb1210.code,
    sequenceName: 'CB1210 cutoff trim, without controller',
    size: 24,
    firstNumber: 501,
    defects: { 7: 'wrong-zener' },
  },
];

const batches: readonly [component: string, batch: string][] = [
  ['D1 reference', 'Z-2210'],
  ['RV1 trimmer', 'T-0418'],
  ['U1 op-amp', 'A-7731'],
  ['C1 reservoir', 'C-3359'],
];

/** Open lots of this week, with the boards that the simulated hands find in their boxes. */
export async function seedLots(
  tx: Transaction,
  people: SeededPeople,
  products: SeededProducts,
  now: Date,
): Promise<void> {
  const week = yearAndWeek(now);
  for (const demo of demoLots) {
    const createdAt = daysFrom(now, -1);
    const [lot] = await tx
      .insert(lots)
      .values({
        code: `${week}-${demo.number}`,
        boardTypeRevisionId: products.boardTypeRevisionIds[demo.boardTypeCode]!,
        sequenceRevisionId: products.sequenceRevisionIds[demo.sequenceName]!,
        size: demo.size,
        createdBy: people.qualityId,
        createdAt,
      })
      .returning();
    const places = Array.from({ length: demo.size }, (_, i) => i + 1);
    const serialAt = (place: number) =>
      demo.boardTypeCode + week + String(demo.firstNumber + place - 1).padStart(5, '0');
    await tx.insert(units).values(places.map((position) => ({ serial: serialAt(position), lotId: lot!.id, position })));
    await tx.insert(simulatedBoards).values(
      places.map((place) => ({
        serial: serialAt(place),
        seed: Number(demo.number) * 10_000 + place,
        defect: demo.defects[place] ?? 'none',
      })),
    );
    await tx.insert(lotComponents).values(
      batches.map(([component, batch]) => ({
        lotId: lot!.id,
        component,
        batch,
        fromAt: createdAt,
        byAccountId: people.qualityId,
      })),
    );
  }
}

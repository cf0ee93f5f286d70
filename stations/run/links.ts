import type { LinkName } from '@/lib/bench/types';
import { safeBelowVolts } from '../instruments/safe-off';
import type { Bench } from '../instruments/open-bench';

/** The answer to *IDN? that each instrument must give; null or absent: any. */
export type ExpectedIdentities = Partial<Record<LinkName, string | null>>;

export interface LinksSeen {
  /** Do not answer. */
  down: LinkName[];
  /** Answer, but are not the instruments that this station was set up and calibrated with. */
  strangers: LinkName[];
  supplySafe: boolean;
}

/** Asks every instrument who it is, and the supply whether it stands below the safe voltage. */
export async function checkLinks(bench: Bench, expected: ExpectedIdentities): Promise<LinksSeen> {
  const health = await bench.health();
  const supplyVolts = await bench.supply.measureVolts().catch(() => null);
  const answering = health.filter((each) => each.identity !== null);
  return {
    down: health.filter((each) => each.identity === null).map((each) => each.instrument),
    strangers: answering
      .filter((each) => expected[each.instrument] && expected[each.instrument] !== each.identity)
      .map((each) => each.instrument),
    supplySafe: supplyVolts !== null && Math.abs(supplyVolts) < safeBelowVolts,
  };
}

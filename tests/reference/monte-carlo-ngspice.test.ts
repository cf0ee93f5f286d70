import { describe, expect, it } from 'vitest';
import { boardTypes } from '@/db/seed/board-types';
import type { BoardDesign } from '@/lib/circuit/board-design';
import { boardsOf, drawDeviations } from '@/lib/circuit/monte-carlo/boards';
import { travelBands } from '@/lib/circuit/monte-carlo/travel-bands';
import { softKneeThresholds } from '@/lib/circuit/soft-knee';
import { wiperAt } from '@/lib/circuit/trimmer';
import { usualTolerances } from '@/lib/contracts/board-type';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';
import { runNetlist } from './ngspice';

/** Own netlist, Debian's ngspice, run here: a Monte Carlo of the same drawn parts, solved by the circuit simulator. */

const boards = 120;

function sideOf(parts: BoardDesign, wiper: number, name: string, output: string): string {
  const { reference } = parts;
  const values = {
    ra: parts.supplyEndOhms,
    rup: (1 - wiper) * parts.trimmerOhms,
    rdown: wiper * parts.trimmerOhms,
    rb: parts.groundEndOhms,
    rf: parts.feedbackOhms,
    rfeed: reference.feedOhms,
    i0: reference.ratedAmps,
    v0: reference.nominalVolts,
    n: reference.kneeVolts,
    vos: parts.comparatorOffsetVolts ?? 0,
  };
  const given = Object.entries(values).map(([key, value]) => `${key}=${value.toExponential(12)}`);
  return `Bo${name} o${name} 0 V = ${output}\nX${name} vs o${name} d${name} side ${given.join(' ')}`;
}

describe.each(boardTypes)('Monte Carlo of $code in ngspice', (boardType) => {
  const type = { ...boardType, tolerances: { ...usualTolerances, comparatorOffsetVolts: 0.004 } };
  const deviations = drawDeviations(boards, wichmannHill(11));
  const drawn = [...boardsOf(type, deviations)];
  const positions = 3;
  const wiper = wiperAt(type.trimmer, type.trimmer.turns / 2);
  const middle = softKneeThresholds(type.design, wiper);
  if (middle.kind !== 'found') throw new Error('The nominal board has no points.');
  const found = runNetlist('many-boards', {
    boards: drawn
      .flatMap((parts, i) => [
        sideOf(parts, wiper, `h${i}`, `V(vs)-${parts.outputDropVolts}`),
        sideOf(parts, wiper, `l${i}`, String(parts.outputLowVolts)),
      ])
      .join('\n'),
    measures: drawn
      .flatMap((_, i) => [
        `.meas dc trip${i} WHEN v(dh${i})=0 CROSS=LAST`,
        `.meas dc release${i} WHEN v(dl${i})=0 CROSS=LAST`,
      ])
      .join('\n'),
    fromVolts: middle.tripVolts * 0.94,
    toVolts: middle.releaseVolts * 1.06,
  });

  it('every board has its points within 0.1 mV', () => {
    drawn.forEach((parts, i) => {
      const points = softKneeThresholds(parts, wiper);
      if (points.kind !== 'found') throw new Error('These parts have no points.');
      expect(Math.abs(found[`trip${i}`]! - points.tripVolts)).toBeLessThan(1e-4);
      expect(Math.abs(found[`release${i}`]! - points.releaseVolts)).toBeLessThan(1e-4);
    });
  });

  it('the bands over the travel are those of the simulated boards', () => {
    const { bands } = travelBands(type, deviations, positions)[1]!;
    const quantile = (point: 'trip' | 'release', share: number) => {
      const sorted = drawn.map((_, i) => found[`${point}${i}`]!).sort((a, b) => a - b);
      const at = share * (boards - 1);
      const low = Math.floor(at);
      return sorted[low]! + (at - low) * (sorted[low + 1]! - sorted[low]!);
    };
    for (const point of ['trip', 'release'] as const) {
      expect(bands![point].lowVolts).toBeCloseTo(quantile(point, 0.01), 3);
      expect(bands![point].highVolts).toBeCloseTo(quantile(point, 0.99), 3);
    }
  });
});

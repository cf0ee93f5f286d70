import { averageRange, type AverageRange } from './average-range';
import { crossedAnova } from './crossed-anova';
import { gaugeFigures, type GaugeFigures } from './gauge-figures';
import { studyCells, type CellsFailure, type GaugeReading, type StudyCells } from './study-cells';
import {
  componentsWithInteraction,
  componentsWithoutInteraction,
  type ComponentName,
  type Components,
} from './variance-components';

interface Analysed extends GaugeFigures {
  components: Components;
}

export interface GaugeStudy {
  kind: 'found';
  cells: StudyCells;
  anova: ReturnType<typeof crossedAnova>;
  withInteraction: Analysed;
  withoutInteraction: Analysed;
  /** The analysis to quote: without the interaction where it is not significant at `poolAbove`. */
  quoted: 'withInteraction' | 'withoutInteraction';
  averageRange: AverageRange & GaugeFigures;
}

/**
 * Crossed gauge repeatability and reproducibility study, by analysis of variance with and without the interaction and by
 * averages and ranges. `toleranceWidth` in the unit of the readings, null for a one-sided limit. Refuses unbalanced readings.
 */
export function gaugeStudy(
  readings: readonly GaugeReading[],
  toleranceWidth: number | null,
  { confidence = 0.95, poolAbove = 0.05 } = {},
): GaugeStudy | CellsFailure {
  const cells = studyCells(readings);
  if (cells.kind !== 'found') return cells;
  const size = { boards: cells.boards.length, operators: cells.operators.length, trials: cells.trials };
  const anova = crossedAnova(cells);
  const analysed = (components: Components): Analysed => ({
    components,
    ...gaugeFigures(variancesOf(components), toleranceWidth),
  });
  const ranges = averageRange(cells);
  return {
    kind: 'found',
    cells,
    anova,
    withInteraction: analysed(componentsWithInteraction(anova, size, confidence)),
    withoutInteraction: analysed(componentsWithoutInteraction(anova, size, confidence)),
    quoted: (anova.full.interaction.p ?? 0) > poolAbove ? 'withoutInteraction' : 'withInteraction',
    averageRange: { ...ranges, ...gaugeFigures(rangeVariances(ranges), toleranceWidth) },
  };
}

function variancesOf(components: Components): Record<ComponentName, number> {
  return Object.fromEntries(Object.entries(components).map(([name, { variance }]) => [name, variance])) as Record<
    ComponentName,
    number
  >;
}

const rangeVariances = (found: AverageRange): Record<ComponentName, number> => ({
  repeatability: found.repeatability ** 2,
  operator: found.operator ** 2,
  interaction: 0,
  reproducibility: found.operator ** 2,
  gauge: found.gauge ** 2,
  board: found.board ** 2,
  total: found.total ** 2,
});

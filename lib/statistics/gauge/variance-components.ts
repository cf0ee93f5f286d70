import type { AnovaRow } from './anova-row';
import { differenceComponent, residualComponent, type Component } from './component';
import type { crossedAnova } from './crossed-anova';
import { sumInterval, type VarianceInterval, type WeightedSquare } from './mean-square-interval';

export type ComponentName =
  'repeatability' | 'operator' | 'interaction' | 'reproducibility' | 'gauge' | 'board' | 'total';

export type Components = Record<ComponentName, Component>;

export interface StudySize {
  boards: number;
  operators: number;
  trials: number;
}

/**
 * Variance components of a crossed study from its analysis of variance, with the interaction. Negative estimates are set to
 * 0 and said. Intervals by modified large samples; reproducibility and total have none. AIAG MSA, 4th ed., appendix A.
 */
export function componentsWithInteraction(
  { full: { board, operator, interaction, repeat } }: ReturnType<typeof crossedAnova>,
  { boards: p, operators: o, trials: r }: StudySize,
  confidence = 0.95,
): Components {
  return assemble(
    {
      repeatability: residualComponent(repeat, confidence),
      interaction: differenceComponent(interaction, repeat, 1 / r, confidence),
      operator: differenceComponent(operator, interaction, 1 / (p * r), confidence),
      board: differenceComponent(board, interaction, 1 / (o * r), confidence),
    },
    sumInterval(
      [weighted(operator, 1 / (p * r)), weighted(interaction, (p - 1) / (p * r)), weighted(repeat, (r - 1) / r)],
      confidence,
    ),
  );
}

/** The same with interaction and repeats pooled into the repeatability, as is usual where the interaction's p is above 0.05. */
export function componentsWithoutInteraction(
  { pooled: { board, operator, repeat } }: ReturnType<typeof crossedAnova>,
  { boards: p, operators: o, trials: r }: StudySize,
  confidence = 0.95,
): Components {
  return assemble(
    {
      repeatability: residualComponent(repeat, confidence),
      interaction: { variance: 0, negative: false, interval: null },
      operator: differenceComponent(operator, repeat, 1 / (p * r), confidence),
      board: differenceComponent(board, repeat, 1 / (o * r), confidence),
    },
    sumInterval([weighted(operator, 1 / (p * r)), weighted(repeat, (p * r - 1) / (p * r))], confidence),
  );
}

const weighted = ({ meanSquare, degrees }: AnovaRow, coefficient: number): WeightedSquare => ({
  coefficient,
  meanSquare,
  degrees,
});

type Estimated = Record<'repeatability' | 'operator' | 'interaction' | 'board', Component>;

function assemble(parts: Estimated, gaugeInterval: VarianceInterval): Components {
  const reproducibility = parts.operator.variance + parts.interaction.variance;
  const gauge = reproducibility + parts.repeatability.variance;
  const sum = (variance: number, interval: VarianceInterval | null): Component => ({
    variance,
    negative: false,
    interval,
  });
  return {
    ...parts,
    reproducibility: sum(reproducibility, null),
    gauge: sum(gauge, gaugeInterval),
    total: sum(gauge + parts.board.variance, null),
  };
}

/** Correlation of two rows of a budget by their contributors' names, -1 to 1. */
export interface Correlation {
  between: readonly [string, string];
  coefficient: number;
}

/** Coefficients of all pairs, 1 with itself. Throws where a name is in no row. */
export function correlationMatrix(names: readonly string[], correlations: readonly Correlation[]): number[][] {
  const matrix = names.map((_, i) => names.map((_, j): number => (i === j ? 1 : 0)));
  for (const { between, coefficient } of correlations) {
    const [i, j] = between.map((name) => names.indexOf(name)) as [number, number];
    if (i < 0 || j < 0 || i === j) throw new RangeError(`No two rows ${between.join(' and ')} to be correlated.`);
    matrix[i]![j] = matrix[j]![i] = coefficient;
  }
  return matrix;
}

/**
 * Lower triangle L with L Lᵀ = `matrix` (Cholesky), also where full correlation makes it singular. Null where the
 * coefficients contradict each other: no quantities can be correlated so.
 */
export function choleskyFactor(matrix: readonly (readonly number[])[]): number[][] | null {
  const factor = matrix.map((row) => row.map(() => 0));
  for (let j = 0; j < matrix.length; j++) {
    const pivot = matrix[j]![j]! - factor[j]!.reduce((sum, l) => sum + l * l, 0);
    if (!(pivot > -1e-12)) return null;
    const root = pivot > 1e-12 ? Math.sqrt(pivot) : 0;
    for (let i = j + 1; i < matrix.length; i++) {
      const rest = matrix[i]![j]! - factor[i]!.reduce((sum, l, k) => sum + l * factor[j]![k]!, 0);
      if (root === 0 && Math.abs(rest) > 1e-9) return null;
      factor[i]![j] = root === 0 ? 0 : rest / root;
    }
    factor[j]![j] = root;
  }
  return factor;
}

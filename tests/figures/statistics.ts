export const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;

export const rootMeanSquare = (values: readonly number[]) => Math.sqrt(mean(values.map((value) => value ** 2)));

/** The smallest value that a share `p` of the values does not exceed. */
export function percentile(values: readonly number[], p: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.max(0, Math.ceil(p * sorted.length) - 1)]!;
}

/** Upper 95 % limit of a share when none was seen in `n`: the rule of three, 1 - 0.05^(1/n). */
export const upperLimitOfNone = (n: number) => 1 - 0.05 ** (1 / n);

export const round = (value: number, digits: number) => Number(value.toFixed(digits));

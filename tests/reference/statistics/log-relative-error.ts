/** Digits that agree: -log10 of the relative error, 15 when equal. NIST StRD calls it LRE. */
export function digitsAgreed(value: number, certified: number): number {
  if (value === certified) return 15;
  return Math.min(15, -Math.log10(Math.abs(value - certified) / Math.abs(certified)));
}

/** Place of the second significant digit of `expanded` once rounded there: 2 for hundredths, -1 for tens. */
function lastPlace(expanded: number): number {
  const place = 1 - Math.floor(Math.log10(expanded));
  // 0.0996 rounds to 0.10, whose second digit is one place further left.
  return Number(expanded.toPrecision(2)) >= 10 ** (2 - place) * (1 - 1e-12) ? place - 1 : place;
}

function written(value: number, place: number): string {
  if (place >= 0) return value.toFixed(Math.min(place, 100));
  const unit = 10 ** -place;
  return String(Math.round(value / unit) * unit);
}

/**
 * A value and its expanded uncertainty (> 0) as people read them: U with two significant digits, the value to the same last
 * place, a point as the decimal sign. JCGM 100:2008, 7.2.6. Null where `expanded` is not a positive number.
 */
export function roundedTogether(
  value: number,
  expanded: number,
): { value: string; expanded: string; place: number } | null {
  if (!(expanded > 0 && Number.isFinite(expanded) && Number.isFinite(value))) return null;
  const place = lastPlace(expanded);
  return { value: written(value, place), expanded: written(expanded, place), place };
}

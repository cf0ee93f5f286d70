/** IEC 60063:2015, series E24: two significant figures of one decade. Zeners and 5 % resistors are made in these. */
const e24 = [
  1.0, 1.1, 1.2, 1.3, 1.5, 1.6, 1.8, 2.0, 2.2, 2.4, 2.7, 3.0, 3.3, 3.6, 3.9, 4.3, 4.7, 5.1, 5.6, 6.2, 6.8, 7.5, 8.2,
  9.1,
];

/** The E24 value nearest by ratio. `value` is above 0. */
export function e24Near(value: number): number {
  const decade = Math.floor(Math.log10(value));
  const candidates = [decade - 1, decade, decade + 1].flatMap((power) => e24.map((v) => Number(`${v}e${power}`)));
  return candidates.reduce((best, v) => (Math.abs(Math.log(v / value)) < Math.abs(Math.log(best / value)) ? v : best));
}

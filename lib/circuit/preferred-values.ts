/** IEC 60063:2015, series E24: two significant figures of one decade. Zeners and 5 % resistors are made in these. */
const e24 = [
  1.0, 1.1, 1.2, 1.3, 1.5, 1.6, 1.8, 2.0, 2.2, 2.4, 2.7, 3.0, 3.3, 3.6, 3.9, 4.3, 4.7, 5.1, 5.6, 6.2, 6.8, 7.5, 8.2,
  9.1,
];
/** IEC 60063:2015, series E96, for parts of 1 % and better: three figures of the geometric steps, without exception. */
const e96 = Array.from({ length: 96 }, (_, step) => Number((10 ** (step / 96)).toFixed(2)));
const series = { E24: e24, E96: e96 };

/** The E24 value nearest by ratio. `value` is above 0. */
export function e24Near(value: number): number {
  return preferredNear(value, 'E24', 1)[0]!;
}

/** Values of a series, nearest by ratio first, from at most a decade away. `value` is above 0. */
export function preferredNear(value: number, name: keyof typeof series, count: number): number[] {
  const decade = Math.floor(Math.log10(value));
  const away = (v: number) => Math.abs(Math.log(v / value));
  return [decade - 1, decade, decade + 1]
    .flatMap((power) => series[name].map((v) => Number(`${v}e${power}`)))
    .sort((a, b) => away(a) - away(b))
    .slice(0, count);
}

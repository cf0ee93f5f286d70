/** What the charts of a lot or a board type can show. Volts, turns, seconds. */
export const chartQuantities = ['trip-volts', 'release-volts', 'hysteresis-volts', 'turns', 'seconds'] as const;
export type ChartQuantity = (typeof chartQuantities)[number];

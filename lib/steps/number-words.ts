/** Values as the sentences of the rules give them. */
export const voltsText = (volts: number) => `${volts.toFixed(3).replace(/0$/, '')} V`;
export const millivoltsText = (volts: number) => `${Number((volts * 1000).toFixed(1))} mV`;
export const millisecondsText = (milliseconds: number) => `${Number(milliseconds.toFixed(1))} ms`;
export const ampsText = (amps: number) => `${Number(amps.toFixed(3))} A`;

const slack = 1e-9;
/** The next value up or down of so many decimals; a value that has no more than those stays. */
export const upTo = (value: number, decimals: number) => rounded(Math.ceil, value - slack, decimals);
export const downTo = (value: number, decimals: number) => rounded(Math.floor, value + slack, decimals);

function rounded(round: (value: number) => number, value: number, decimals: number): number {
  const scale = 10 ** decimals;
  return Number((round(value * scale) / scale).toFixed(decimals));
}

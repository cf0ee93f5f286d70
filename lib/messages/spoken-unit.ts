const rounded = (value: number, digits: number) => value.toFixed(digits).replace('-', '\u2212');

/** A measured value in the unit that people say it in; the quantity's name carries the stored unit. */
export function inSpokenUnit(
  quantity: string,
  value: number,
): { text: string; unit: string; scale: number; digits: number } {
  const [scale, digits, unit] = quantity.endsWith('-amps')
    ? [1_000, 2, 'mA']
    : quantity.endsWith('-seconds')
      ? [1_000, 1, 'ms']
      : quantity.endsWith('-milliohms')
        ? [1, 0, '']
        : quantity === 'trip-spread-volts' || quantity === 'drift-volts'
          ? [1_000, 1, 'mV']
          : [1, 2, 'V'];
  return { text: rounded(value * scale, digits), unit, scale, digits };
}

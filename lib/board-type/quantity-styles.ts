import type { QuantityStyle } from './quantity-text';

export const ohmsStyle: QuantityStyle = { unit: 'Ω', bareExponent: 0, shownExponents: [6, 3, 0] };
export const voltsStyle: QuantityStyle = { unit: 'V', bareExponent: 0, shownExponents: [0], leastDecimals: 2 };
export const millivoltsStyle: QuantityStyle = { unit: 'V', bareExponent: -3, shownExponents: [-3] };
export const milliampsStyle: QuantityStyle = { unit: 'A', bareExponent: -3, shownExponents: [-3] };
export const microfaradsStyle: QuantityStyle = { unit: 'F', bareExponent: -6, shownExponents: [-6] };
export const millisecondsStyle: QuantityStyle = { unit: 's', bareExponent: -3, shownExponents: [-3] };
export const toleranceStyle: QuantityStyle = { unit: '%', bareExponent: -2, shownExponents: [-2], lead: '± ' };
export const offsetStyle: QuantityStyle = { ...millivoltsStyle, lead: '± ' };
export const turnsStyle: QuantityStyle = { unit: 'turns', bareExponent: 0, shownExponents: [0] };
export const degreesStyle: QuantityStyle = { unit: '°', bareExponent: 0, shownExponents: [0] };

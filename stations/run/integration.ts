/** Integration, in power-line cycles: of a value that is kept, and of one that only tells on from off. */
export const valueCycles = 1;
export const stateCycles = 0.1;

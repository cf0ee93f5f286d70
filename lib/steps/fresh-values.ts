/** The middle of a band, to a hundredth. */
export const middleOf = ({ min, max }: { min: number; max: number }) => Math.round((min + max) * 50) / 100;

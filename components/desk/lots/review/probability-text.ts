/** "p = 0.042", "p < 0.001". */
export const probabilityText = (p: number) => (p < 0.001 ? 'p < 0.001' : `p = ${p.toFixed(3)}`);

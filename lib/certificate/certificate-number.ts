/** What a certificate's number begins with: 2648-B-00042 of a board, 2648-B-LOT of the whole lot. */
export function numberStem(lotCode: string, serial: string | null): string {
  return `${lotCode}-${serial === null ? 'LOT' : serial.slice(-5)}`;
}

/** The next number of a stem: 2648-B-00042-2 after 2648-B-00042-1. A number is never given twice. */
export function nextNumber(stem: string, given: readonly string[]): string {
  const copies = given
    .filter((number) => number.startsWith(`${stem}-`))
    .map((number) => Number(number.slice(stem.length + 1)));
  return `${stem}-${1 + Math.max(0, ...copies.filter(Number.isInteger))}`;
}

/**
 * A serial number in the groups that people read aloud: the board type, what lies between, the last five. Only for the eye;
 * the barcode carries the plain serial.
 */
export function serialGroups(serial: string, boardTypeCode?: string): string[] {
  const lead = boardTypeCode && serial.startsWith(boardTypeCode) ? boardTypeCode : '';
  const rest = serial.slice(lead.length);
  return [lead, rest.slice(0, -5), rest.slice(-5)].filter((group) => group !== '');
}

/** Parts of a serial number for reading: the last five characters stand out, four digits before them form a group. */
export function splitSerial(serial: string): { groups: string[]; tail: string } {
  const tail = serial.slice(-5);
  const head = serial.slice(0, -5).replace(/[\s-]+$/, '');
  const dated = /^(.+?)[\s-]?(\d{4})$/.exec(head);
  if (dated) return { groups: [dated[1]!, dated[2]!], tail };
  return { groups: head ? [head] : [], tail };
}

import { tolerancesOf, type BoardType } from '../contracts/board-type';
import { numberFields, travelUnitOf, valueAt, writeField } from './board-type-form';

export interface BoardTypeChange {
  label: string;
  before: string;
  after: string;
}

const sensingWords = { 'output-voltage': 'by the output voltage', 'load-current': 'by the supply current' } as const;
const yes = (on: boolean) => (on ? 'printed' : 'not printed');

/** What differs between two revisions of a board type, field by field in words. */
export function compareBoardTypes(before: BoardType, after: BoardType): BoardTypeChange[] {
  const changes: BoardTypeChange[] = [];
  const tell = (label: string, a: string, b: string) => {
    if (a !== b) changes.push({ label, before: a, after: b });
  };
  const [a, b] = [before, after].map((each) => ({ ...each, tolerances: tolerancesOf(each) }));
  tell('Name', before.name, after.name);
  for (const field of numberFields({ travelUnit: travelUnitOf(after), sensing: after.sensing.kind })) {
    const [old, now] = [valueAt(a!, field.path), valueAt(b!, field.path)] as [number | undefined, number];
    if (old !== now) tell(field.label, old === undefined ? 'none' : writeField(field, old), writeField(field, now));
  }
  tell('Output’s state is told', sensingWords[before.sensing.kind], sensingWords[after.sensing.kind]);
  tell('Clockwise', `${before.trimmer.clockwise} the trip point`, `${after.trimmer.clockwise} the trip point`);
  tell('Serial pattern', before.serialPattern, after.serialPattern);
  tell('Type on the label', yes(before.label?.typeLine ?? true), yes(after.label?.typeLine ?? true));
  tell('Points on the label', yes(before.label?.pointsLine ?? true), yes(after.label?.pointsLine ?? true));
  if (JSON.stringify(before.trimmerPhoto) !== JSON.stringify(after.trimmerPhoto))
    tell(
      'Photograph',
      before.trimmerPhoto ? 'the earlier one' : 'none',
      after.trimmerPhoto ? 'another, or its frame moved' : 'none',
    );
  if (before.fixtureDrawing?.fileId !== after.fixtureDrawing?.fileId)
    tell(
      'Fixture drawing',
      before.fixtureDrawing ? 'the earlier one' : 'none',
      after.fixtureDrawing ? 'another one' : 'none',
    );
  return changes;
}

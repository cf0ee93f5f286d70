type Fields = Record<string, unknown> | null;

/** `unit.retest-ordered` as people say it: Unit, retest ordered. */
export function actionWords(action: string): string {
  const [thing = '', ...rest] = action.split('.');
  const words = [thing, rest.join(' ')].filter(Boolean).map((part) => part.replace(/-/g, ' '));
  const sentence = words.join(', ');
  return sentence.charAt(0).toUpperCase() + sentence.slice(1);
}

/** `tripVoltsMax` as words: trip volts max. */
export function fieldWords(name: string): string {
  return name
    .replace(/([a-z0-9])([A-Z])/g, '$1 $2')
    .replace(/[_-]/g, ' ')
    .toLowerCase();
}

const longest = 60;

/** A stored value in one short line. */
export function valueWords(value: unknown): string | null {
  if (value === undefined || value === null) return null;
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  const text = typeof value === 'string' ? value : JSON.stringify(value);
  return text.length > longest ? `${text.slice(0, longest - 1)}…` : text;
}

/** What differs between before and after, in the order of the names they were stored with. */
export function changesOf(before: Fields, after: Fields): { name: string; from: string | null; to: string | null }[] {
  const names = [...new Set([...Object.keys(before ?? {}), ...Object.keys(after ?? {})])];
  return names
    .map((name) => ({ name: fieldWords(name), from: valueWords(before?.[name]), to: valueWords(after?.[name]) }))
    .filter(({ from, to }) => from !== to);
}

const knownBy = ['code', 'serial', 'name', 'number', 'revision', 'station', 'lot'];

/** What a person knows the thing by, else the beginning of its id. */
export function thingWords(entityId: string, before: Fields, after: Fields): string {
  for (const name of knownBy) {
    const value = after?.[name] ?? before?.[name];
    if (typeof value === 'string' && value !== '') return value;
  }
  return /^[0-9a-f]{8}-/.test(entityId) ? entityId.slice(0, 8) : entityId;
}

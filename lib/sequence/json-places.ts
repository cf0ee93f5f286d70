/** A JSON text that was read, with the line that each value stands on; or where and why it is not JSON. Lines from 1. */
export type ReadJson =
  | {
      ok: true;
      value: unknown;
      lineOf(path: readonly PropertyKey[]): number;
      repeated: { line: number; key: string }[];
    }
  | { ok: false; line: number; reason: string };

class Unreadable extends Error {
  constructor(
    readonly at: number,
    readonly reason: string,
  ) {
    super(reason);
  }
}

const mostDepth = 64;

/** Reads JSON (RFC 8259) and keeps where each value stands. A path is of keys and indexes: ['steps', 2, 'volts']. */
export function readJson(text: string): ReadJson {
  const places = new Map<string, number>();
  const repeated: { line: number; key: string }[] = [];
  const lineAt = (at: number) => text.slice(0, at).split('\n').length;
  let at = text.charCodeAt(0) === 0xfeff ? 1 : 0;

  const skip = () => {
    while (at < text.length && ' \t\r\n'.includes(text[at]!)) at++;
  };
  const fail = (reason: string, where = at): never => {
    throw new Unreadable(where, reason);
  };
  const found = () => (at < text.length ? `“${text[at]}”` : 'the end of the file');

  function value(path: string, depth: number): unknown {
    skip();
    places.set(path, at);
    if (depth > mostDepth) return fail('It is nested too deeply.');
    if (text[at] === '{') return object(path, depth);
    if (text[at] === '[') return array(path, depth);
    if (text[at] === '"') return string();
    const [word] = /[-+.\w]*/.exec(text.slice(at, at + 40))!;
    if (!/^(true|false|null|-?(0|[1-9]\d*)(\.\d+)?([eE][-+]?\d+)?)$/.test(word))
      return fail(`A value is expected, not ${word ? `“${word}”` : found()}.`);
    at += word.length;
    return JSON.parse(word);
  }

  function string(): string {
    const match = /"(?:[^"\\\u0000-\u001f]|\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4}))*"/y;
    match.lastIndex = at;
    const [quoted] =
      match.exec(text) ?? fail('A text does not end, or holds a sign that must be written with a backslash.');
    at += quoted.length;
    return JSON.parse(quoted) as string;
  }

  function object(path: string, depth: number): Record<string, unknown> {
    const made: [string, unknown][] = [];
    members('}', () => {
      if (text[at] !== '"') fail(`A field's name in quotes is expected, not ${found()}.`);
      const keyAt = at;
      const key = string();
      if (made.some(([name]) => name === key)) repeated.push({ line: lineAt(keyAt), key });
      skip();
      if (text[at] !== ':') fail(`A colon is expected after “${key}”, not ${found()}.`);
      at++;
      made.push([key, value(`${path}/${key}`, depth + 1)]);
    });
    return Object.fromEntries(made);
  }

  function array(path: string, depth: number): unknown[] {
    const made: unknown[] = [];
    members(']', () => made.push(value(`${path}/${made.length}`, depth + 1)));
    return made;
  }

  function members(end: string, one: () => void): void {
    at++;
    skip();
    if (text[at] === end) {
      at++;
      return;
    }
    for (;;) {
      skip();
      one();
      skip();
      if (text[at] === end) break;
      if (text[at] !== ',') fail(`A comma or “${end}” is expected, not ${found()}.`);
      at++;
    }
    at++;
  }

  try {
    const read = value('', 0);
    skip();
    if (at < text.length) fail(`Nothing more is expected, but there is ${found()}.`);
    return { ok: true, value: read, repeated, lineOf: (path) => lineAt(nearest(places, path)) };
  } catch (error) {
    if (!(error instanceof Unreadable)) throw error;
    return { ok: false, line: lineAt(error.at), reason: error.reason };
  }
}

/** Where a value stands, or what it is missing from. */
function nearest(places: ReadonlyMap<string, number>, path: readonly PropertyKey[]): number {
  for (let length = path.length; length >= 0; length--) {
    const place = places.get(
      path
        .slice(0, length)
        .map((key) => `/${String(key)}`)
        .join(''),
    );
    if (place !== undefined) return place;
  }
  return 0;
}

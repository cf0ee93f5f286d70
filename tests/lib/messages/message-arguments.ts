/** Names of the arguments and tags of an ICU message, branches of plural and select included. */
export function messageArguments(message: string): Set<string> {
  const names = new Set<string>();
  for (const tag of message.matchAll(/<(\w+)>/g)) names.add(`<${tag[1]}>`);
  collect(message, names);
  return names;
}

function collect(text: string, names: Set<string>) {
  for (let i = 0; i < text.length; i++) {
    if (text[i] !== '{') continue;
    const end = closing(text, i);
    const [name = '', kind = '', ...rest] = text.slice(i + 1, end).split(',');
    names.add(name.trim());
    if (['plural', 'select', 'selectordinal'].includes(kind.trim())) branches(rest.join(','), names);
    i = end;
  }
}

/** `one {…} other {…}`: only what stands inside the braces is text. */
function branches(text: string, names: Set<string>) {
  for (let i = 0; i < text.length; i++) {
    if (text[i] !== '{') continue;
    const end = closing(text, i);
    collect(text.slice(i + 1, end), names);
    i = end;
  }
}

function closing(text: string, from: number): number {
  let depth = 0;
  for (let i = from; i < text.length; i++) {
    if (text[i] === '{') depth += 1;
    if (text[i] === '}' && --depth === 0) return i;
  }
  throw new Error(`A brace is not closed in: ${text}`);
}

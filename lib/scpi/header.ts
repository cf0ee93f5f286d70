interface Node {
  short: string;
  long: string;
  optional: boolean;
}

const nodePattern = /(\[)?:?([A-Z]+)([a-z]*)\]?/g;

/**
 * Whether a program header matches a command's pattern in SCPI notation, such as `[SOURce:]VOLTage:PROTection:TRIPped?`:
 * capitals are the short form, brackets enclose optional nodes. Only the exact short or long form counts (SCPI-1999 6.2.1).
 */
export function headerMatches(pattern: string, header: string): boolean {
  if (pattern.endsWith('?') !== header.endsWith('?')) return false;
  const heard = header.replace(/^:/, '').replace(/\?$/, '').toUpperCase();
  if (pattern.startsWith('*')) return heard === pattern.replace(/\?$/, '').toUpperCase();
  return matchNodes(nodesOf(pattern), heard.split(':'));
}

function nodesOf(pattern: string): Node[] {
  return [...pattern.matchAll(nodePattern)].map((match) => ({
    short: match[2]!,
    long: (match[2]! + match[3]!).toUpperCase(),
    optional: match[1] === '[',
  }));
}

function matchNodes(nodes: Node[], heard: string[]): boolean {
  const [node, ...restOfNodes] = nodes;
  if (!node) return heard.length === 0;
  const [word, ...restOfHeard] = heard;
  if ((word === node.short || word === node.long) && matchNodes(restOfNodes, restOfHeard)) return true;
  return node.optional && matchNodes(restOfNodes, heard);
}

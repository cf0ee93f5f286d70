import { fileURLToPath } from 'node:url';

export interface Entry {
  path: string;
  /** Of Node.js; TypeScript in development is run by tsx. */
  execArgv: string[];
}

/** An entry point beside the one that is running: bundled in dist, or this folder's own source in development. */
export function entryOf(name: 'child' | 'worker'): Entry {
  const bundled = import.meta.url.endsWith('.mjs');
  const url = new URL(bundled ? `./dry-run-${name}.mjs` : `./${name}.ts`, import.meta.url);
  return { path: fileURLToPath(url), execArgv: bundled ? ['--enable-source-maps'] : ['--import', 'tsx'] };
}

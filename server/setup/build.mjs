import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { runCommand } from './run-command.mjs';

const sources = ['app', 'components', 'db', 'lib', 'server', 'stations', 'public'];
const files = [
  'package-lock.json',
  'next.config.ts',
  'postcss.config.mjs',
  'tsconfig.json',
  'proxy.ts',
  'instrumentation.ts',
];
const stamp = 'dist/built-from';

function* walk(folder) {
  for (const entry of readdirSync(folder, { withFileTypes: true }).sort((a, b) => (a.name < b.name ? -1 : 1))) {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) yield* walk(path);
    else yield path;
  }
}

function sourceHash() {
  const hash = createHash('sha256');
  for (const path of [
    ...sources.filter(existsSync).flatMap((folder) => [...walk(folder)]),
    ...files.filter(existsSync),
  ])
    hash.update(path).update('\0').update(readFileSync(path)).update('\0');
  return hash.digest('hex');
}

/** Whether the production build was made from the sources as they are now. */
export function buildIsCurrent() {
  return existsSync(stamp) && existsSync('.next/BUILD_ID') && readFileSync(stamp, 'utf8') === sourceHash();
}

/** Builds the pages with Next.js and the server with esbuild, into .next and dist. */
export async function build() {
  rmSync(stamp, { force: true });
  const made = sourceHash();
  const environment = { ...process.env, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' };
  await runCommand(process.execPath, ['node_modules/next/dist/bin/next', 'build'], { env: environment });
  const esbuild = await import('esbuild');
  await esbuild.build({
    entryPoints: {
      server: 'server/index.ts',
      'dry-run-child': 'server/dry-runs/child.ts',
      'dry-run-worker': 'server/dry-runs/worker.ts',
    },
    outdir: 'dist',
    outExtension: { '.js': '.mjs' },
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    packages: 'external',
    sourcemap: true,
    logLevel: 'warning',
  });
  await esbuild.stop();
  writeFileSync(stamp, made);
}

// The start command: everything a fresh clone needs, then the server. Imports only node: modules until packages are installed.
import { spawn } from 'node:child_process';
import { mkdirSync } from 'node:fs';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { installPackages, packagesAreCurrent } from './packages.mjs';
import { giveUp, step } from './progress.mjs';

const root = fileURLToPath(new URL('../..', import.meta.url));
process.chdir(root);
const development = process.argv.includes('--dev');

async function prepare() {
  if (Number(process.versions.node.split('.')[0]) !== 20)
    giveUp(`Sillwright needs Node.js 20; this is ${process.versions.node}. Install Node.js 20, then start again.`);
  if (!packagesAreCurrent()) await step('Installing packages (about a minute)', installPackages);

  mkdirSync('.sillwright', { recursive: true });
  let cluster = null;
  if (!process.env.DATABASE_URL) {
    const { localCluster } = await import('./local-cluster.mjs');
    cluster = await step('Starting PostgreSQL', localCluster);
    process.env.DATABASE_URL = cluster.url;
    process.env.SILLWRIGHT_DEMO = '1';
  }
  if (!development) {
    const { build, buildIsCurrent } = await import('./build.mjs');
    if (!buildIsCurrent()) await step('Building (about a minute)', build);
  }
  return cluster;
}

/** Runs the server in a process of its own, so that a development server can be given tsx; passes on the signals to stop. */
async function serve(cluster) {
  process.env.NODE_ENV = development ? 'development' : 'production';
  const args = development ? ['--import', 'tsx', 'server/index.ts'] : ['--enable-source-maps', 'dist/server.mjs'];
  // Its own process group, so that Ctrl-C reaches it once, through us; the channel tells it when we are gone.
  const server = spawn(process.execPath, args, { stdio: ['inherit', 'inherit', 'inherit', 'ipc'], detached: true });
  let asked = 0;
  const pass = (signal) => {
    asked += 1;
    server.kill(asked > 3 ? 'SIGKILL' : signal);
  };
  process.on('SIGTERM', () => pass('SIGTERM'));
  process.on('SIGINT', () => pass('SIGINT'));
  const code = await new Promise((done) =>
    server.on('exit', (status, signal) => done(status ?? (signal === 'SIGKILL' ? 137 : 1))),
  );
  await cluster?.stop().catch(() => undefined);
  process.exit(code);
}

if (import.meta.url === pathToFileURL(process.argv[1]).href)
  prepare()
    .then(serve)
    .catch((error) => giveUp(error.message));

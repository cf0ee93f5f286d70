import { execFileSync, spawn, type ChildProcess } from 'node:child_process';
import { accessSync, chownSync, constants, mkdtempSync, openSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { Client } from 'pg';

export interface Cluster {
  /** Address of a database of this cluster, signed in as its owner. */
  urlOf(database: string): string;
  stop(): Promise<void>;
}

function binFolder(): string {
  const root = '/usr/lib/postgresql';
  const newest = readdirSync(root)
    .filter((name) => /^\d+$/.test(name))
    .sort((a, b) => Number(b) - Number(a))[0];
  if (!newest) throw new Error(`PostgreSQL is not installed below ${root}.`);
  return path.join(root, newest, 'bin');
}

/** PostgreSQL refuses to run as root, so it is spawned as its own user there. */
function serverUser(): { uid: number; gid: number } | null {
  if (process.getuid?.() !== 0) return null;
  const numberOf = (flag: string) => Number(execFileSync('id', [flag, 'postgres'], { encoding: 'utf8' }));
  return { uid: numberOf('-u'), gid: numberOf('-g') };
}

/** A new folder that `user` can reach; a private parent of the temporary folder would shut it out. */
function makeDataFolder(user: { uid: number; gid: number } | null): string {
  for (const parent of [tmpdir(), '/var/tmp']) {
    const folder = mkdtempSync(path.join(parent, 'sillwright-test-'));
    if (!user) return folder;
    chownSync(folder, user.uid, user.gid);
    try {
      execFileSync('ls', [folder], { ...user, cwd: '/', stdio: 'ignore' });
      return folder;
    } catch {
      rmSync(folder, { recursive: true });
    }
  }
  throw new Error('Neither the temporary folder nor /var/tmp can be reached by the user postgres.');
}

async function freePort(): Promise<number> {
  const server = createServer();
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo;
  await new Promise((resolve) => server.close(resolve));
  return port;
}

async function waitUntilItAnswers(url: string, server: ChildProcess, logFile: string): Promise<void> {
  for (let tries = 0; tries < 200; tries++) {
    if (server.exitCode !== null) break;
    const client = new Client({ connectionString: url });
    client.on('error', () => {});
    try {
      await client.connect();
      await client.end();
      return;
    } catch {
      await sleep(50);
    }
  }
  throw new Error(`PostgreSQL did not start:\n${readFileSync(logFile, 'utf8')}`);
}

/** Starts a private PostgreSQL on loopback in a folder of its own; nothing of it is left after `stop`. */
export async function startCluster(): Promise<Cluster> {
  const bin = binFolder();
  accessSync(path.join(bin, 'postgres'), constants.X_OK);
  const user = serverUser();
  const folder = makeDataFolder(user);
  const data = path.join(folder, 'data');
  const as = { ...user, cwd: '/' };
  execFileSync(
    path.join(bin, 'initdb'),
    ['-D', data, '-U', 'postgres', '--auth=trust', '-E', 'UTF8', '--locale=C', '-N'],
    {
      ...as,
      stdio: 'ignore',
    },
  );
  const port = await freePort();
  const logFile = path.join(folder, 'log');
  const log = openSync(logFile, 'a');
  const quick = ['fsync=off', 'full_page_writes=off', 'synchronous_commit=off', 'max_connections=60'];
  const server = spawn(
    path.join(bin, 'postgres'),
    ['-D', data, '-p', String(port), '-c', 'listen_addresses=127.0.0.1', '-c', 'unix_socket_directories='].concat(
      quick.flatMap((setting) => ['-c', setting]),
    ),
    { ...as, stdio: ['ignore', log, log] },
  );
  const killWithParent = () => server.kill('SIGQUIT');
  process.once('exit', killWithParent);
  const urlOf = (database: string) => `postgres://postgres@127.0.0.1:${port}/${database}`;
  await waitUntilItAnswers(urlOf('postgres'), server, logFile);
  return {
    urlOf,
    async stop() {
      process.off('exit', killWithParent);
      if (server.exitCode === null) {
        const ended = new Promise((resolve) => server.once('exit', resolve));
        server.kill('SIGINT');
        await ended;
      }
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

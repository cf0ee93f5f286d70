import { randomBytes } from 'node:crypto';
import { chmodSync, chownSync, existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createConnection, createServer } from 'node:net';
import { join } from 'node:path';
import { execFileSync } from 'node:child_process';
import { findPostgresPrograms, installDebianPackages } from './debian.mjs';
import { runCommand } from './run-command.mjs';

const loopback = '127.0.0.1';

/** A TCP port that is free on loopback now. */
export function findFreePort() {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.on('error', reject);
    server.listen(0, loopback, () => {
      const { port } = server.address();
      server.close(() => resolve(port));
    });
  });
}

function answers(port) {
  return new Promise((resolve) => {
    const socket = createConnection({ host: loopback, port });
    socket.setTimeout(1000);
    const end = (value) => {
      socket.destroy();
      resolve(value);
    };
    socket.on('connect', () => end(true));
    socket.on('error', () => end(false));
    socket.on('timeout', () => end(false));
  });
}

/** PostgreSQL refuses root, so root hands the cluster to the `postgres` account; others run it as themselves. */
function clusterOwner() {
  if (process.getuid?.() !== 0) return null;
  const [uid, gid] = ['-u', '-g'].map((flag) => Number(execFileSync('id', [flag, 'postgres']).toString()));
  return { uid, gid };
}

async function programsFolder() {
  if (!findPostgresPrograms()) await installDebianPackages(['postgresql']);
  const programs = findPostgresPrograms();
  if (!programs) throw new Error('PostgreSQL was installed but its programs were not found below /usr/lib/postgresql.');
  return programs;
}

/**
 * Makes (once) and starts a private PostgreSQL cluster below `folder`, on loopback only, with a password of its own.
 * Returns the address of its `sillwright` database and `stop`, which ends the server and leaves the data.
 * `fast` trades durability for speed: for tests only.
 */
export async function startCluster(folder, { fast = false } = {}) {
  const programs = await programsFolder();
  const owner = clusterOwner();
  const data = join(folder, 'data');
  const log = join(folder, 'postgres.log');
  const passwordFile = join(folder, 'password');
  const as = { cwd: '/', ...(owner ?? {}) };
  const give = (path) => owner && chownSync(path, owner.uid, owner.gid);

  mkdirSync(folder, { recursive: true });
  chmodSync(folder, 0o700);
  give(folder);
  if (!existsSync(join(data, 'PG_VERSION'))) {
    rmSync(data, { recursive: true, force: true });
    writeFileSync(passwordFile, randomBytes(18).toString('base64url'), { mode: 0o600 });
    give(passwordFile);
    await runCommand(
      join(programs, 'initdb'),
      [
        '-D',
        data,
        '-U',
        'sillwright',
        '--auth=scram-sha-256',
        `--pwfile=${passwordFile}`,
        '-E',
        'UTF8',
        '--locale=C.UTF-8',
        ...(fast ? ['-N'] : []),
      ],
      as,
    );
  }
  const password = readFileSync(passwordFile, 'utf8').trim();

  const portFile = join(folder, 'port');
  const remembered = existsSync(portFile) ? Number(readFileSync(portFile, 'utf8')) : null;
  const running = existsSync(join(data, 'postmaster.pid')) && remembered !== null && (await answers(remembered));
  let port = remembered;
  if (!running) {
    if (port === null || (await answers(port))) port = await findFreePort();
    writeFileSync(portFile, String(port));
    const options = [
      `-p ${port}`,
      `-c listen_addresses=${loopback}`,
      `-c unix_socket_directories=''`,
      '-c max_connections=120',
      ...(fast ? ['-c fsync=off', '-c synchronous_commit=off', '-c full_page_writes=off'] : []),
    ].join(' ');
    const start = () =>
      runCommand(join(programs, 'pg_ctl'), ['start', '-D', data, '-l', log, '-w', '-t', '60', '-s', '-o', options], {
        ...as,
        stdio: 'ignore',
      });
    // After a crash the first start can trip over a stale pid file; the second sees it removed.
    await start().catch(start);
  }
  return {
    /** False: it was running already, for somebody else. */
    startedHere: !running,
    url: `postgresql://sillwright:${password}@${loopback}:${port}/postgres`,
    stop: () =>
      runCommand(join(programs, 'pg_ctl'), ['stop', '-D', data, '-m', 'fast', '-w', '-s'], { ...as, stdio: 'ignore' }),
  };
}

/** Whether `postgres` could work in this folder: it must be able to traverse every parent. */
export function postgresCanUse(folder) {
  const owner = clusterOwner();
  if (!owner) return true;
  try {
    mkdirSync(folder, { recursive: true });
    execFileSync('test', ['-x', folder], { ...owner, cwd: '/' });
    return true;
  } catch {
    return false;
  }
}

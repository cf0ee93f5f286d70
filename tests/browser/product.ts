import { spawn, type ChildProcess } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startCluster } from '@/tests/database/cluster';
import { findFreePort } from '@/server/setup/postgres-cluster.mjs';

export interface Product {
  url: string;
  databaseUrl: string;
  /** What the server printed so far. */
  output(): string;
  /** Ends the server by a signal, waits for it, and removes its database. */
  stop(signal?: NodeJS.Signals): Promise<void>;
  /** Ends the server and keeps the database; `start` again continues on it. */
  end(signal: NodeJS.Signals): Promise<number | null>;
  start(): Promise<void>;
}

/** The nightly tests run on the real clock, the others on one 20 times as fast. */
const usualClockRate = process.env.SILLWRIGHT_NIGHTLY ? 1 : 20;

/** The built product on a fresh demo database, on loopback. `clockRate` speeds the simulated stations up. */
export async function startProduct({ clockRate = usualClockRate } = {}): Promise<Product> {
  const folder = mkdtempSync(join(tmpdir(), 'sillwright-'));
  const cluster = await startCluster();
  const databaseUrl = cluster.urlOf('postgres');
  const port = await findFreePort();
  const url = `http://127.0.0.1:${port}`;
  let output = '';
  let server: ChildProcess | null = null;

  async function start(): Promise<void> {
    const child = spawn(process.execPath, ['--enable-source-maps', 'dist/server.mjs'], {
      stdio: ['ignore', 'pipe', 'pipe'],
      env: {
        ...process.env,
        NODE_ENV: 'production',
        DATABASE_URL: databaseUrl,
        DATABASE_OWNER_URL: '',
        PORT: String(port),
        PUBLIC_URL: '',
        SILLWRIGHT_DEMO: '1',
        SILLWRIGHT_DATA: folder,
        SILLWRIGHT_CLOCK_RATE: String(clockRate),
      },
    });
    server = child;
    child.stdout.on('data', (chunk) => (output += chunk));
    child.stderr.on('data', (chunk) => (output += chunk));
    const deadline = Date.now() + 60_000;
    for (;;) {
      if (child.exitCode !== null) throw new Error(`The server ended with ${child.exitCode}:\n${output}`);
      if (Date.now() > deadline) throw new Error(`The server did not answer within 60 s:\n${output}`);
      const answer = await fetch(`${url}/sign-in`).catch(() => null);
      if (answer?.ok) return;
      await new Promise((resolve) => setTimeout(resolve, 150));
    }
  }

  async function end(signal: NodeJS.Signals): Promise<number | null> {
    const child = server;
    if (!child || child.exitCode !== null) return child?.exitCode ?? null;
    const ended = new Promise<number | null>((resolve) => child.once('exit', (code) => resolve(code)));
    child.kill(signal);
    return ended;
  }

  await start();
  return {
    url,
    databaseUrl,
    output: () => output,
    start,
    end,
    async stop(signal = 'SIGTERM') {
      await end(signal);
      await cluster.stop().catch(() => undefined);
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

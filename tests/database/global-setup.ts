import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { TestProject } from 'vitest/node';
import { openDatabase } from '@/db/client';
import { migrate } from '@/db/migrate';
import { startCluster, type Cluster } from './cluster';

/** The migrated database that each test file's own is copied from. */
const template = 'migrated';

/**
 * Test files run in processes of their own and share one cluster, started when the first of them asks: a GET answers with
 * the address of a fresh, migrated database.
 */
export default async function setUp(project: TestProject): Promise<() => Promise<void>> {
  let cluster: Promise<Cluster> | undefined;
  let made = 0;
  let last: Promise<unknown> = Promise.resolve();

  async function startMigrated(): Promise<Cluster> {
    const started = await startCluster();
    await query(started, `create database ${template}`);
    await migrate(started.urlOf(template));
    return started;
  }

  async function query(on: Cluster, text: string): Promise<void> {
    const { pool } = openDatabase(on.urlOf('postgres'), 1);
    await pool.query(text).finally(() => pool.end());
  }

  async function freshDatabase(): Promise<string> {
    const running = await (cluster ??= startMigrated());
    const name = `test_${++made}`;
    await query(running, `create database ${name} template ${template}`);
    return running.urlOf(name);
  }

  const server = createServer((_, response) => {
    // One at a time: a template cannot be copied while another session copies it.
    const url = (last = last.catch(() => {}).then(freshDatabase));
    url.then(
      (text) => response.end(text),
      (error: unknown) => response.writeHead(500).end(String(error)),
    );
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  project.provide('databaseMaker', `http://127.0.0.1:${(server.address() as AddressInfo).port}/`);
  return async () => {
    server.close();
    await (await cluster?.catch(() => undefined))?.stop();
  };
}

declare module 'vitest' {
  interface ProvidedContext {
    databaseMaker: string;
  }
}

import { createServer as createHttpServer, type IncomingMessage, type ServerResponse } from 'node:http';
import { createServer as createHttpsServer } from 'node:https';
import { mkdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import next from 'next';
import pino from 'pino';
import { closeSharedDatabases } from '@/db/client';
import { migrate } from '@/db/migrate';
import { environment, readEnvironment, type Environment } from './environment';
import { storeDemoPictures } from './demo-pictures';
import { startDemoPrinter } from './demo-printer';
import { startDryRuns } from './dry-runs/start-dry-runs';
import { startFakeStorage } from './files/storage/fake-storage';
import { objectStore } from './files/storage/object-store';
import { startLabelSender } from './operations/labels/label-sender';
import { startTrailKeeper } from './operations/trail/trail-keeper';
import { startLive } from './live/start-live';
import { localSecret } from './local-secret';
import { database } from './postgres';
import { welcome } from './welcome';

const log = pino({ level: process.env.LOG_LEVEL ?? 'warn' });

/** Handles plain requests until Next is ready to. */
type Handler = (request: IncomingMessage, response: ServerResponse) => void;

function createServer(settings: Environment, handle: Handler) {
  if (!settings.tls) return createHttpServer(handle);
  const { certificateFile, keyFile } = settings.tls;
  return createHttpsServer({ cert: readFileSync(certificateFile), key: readFileSync(keyFile) }, handle);
}

async function main(): Promise<void> {
  mkdirSync(process.env.SILLWRIGHT_DATA ?? '.sillwright', { recursive: true });
  process.env.NEXTAUTH_SECRET ??= localSecret(process.env.SILLWRIGHT_DATA ?? '.sillwright');
  const read = readEnvironment(process.env);
  if (!read.ok) {
    for (const sentence of read.sentences) console.error(sentence);
    process.exit(2);
  }
  const storage =
    read.environment.demo && !read.environment.storage
      ? await startFakeStorage(join(read.environment.dataFolder, 'files'))
      : null;
  // Next's copies of the modules read their settings from here too.
  Object.assign(process.env, storage?.variables);
  const settings = environment();
  process.env.NEXTAUTH_URL = settings.publicUrl;

  await migrate(settings.databaseOwnerUrl, settings.databaseUrl);
  const greeting = await welcome(settings);
  if (storage) await storeDemoPictures().catch((error: unknown) => log.warn(error));

  let handle: Handler = (_, response) =>
    void response.writeHead(503, { 'retry-after': '2' }).end('Sillwright is starting.');
  const httpServer = createServer(settings, (request, response) => {
    // Whoever asks could write it themselves; then Next gives the address of the socket.
    if (!settings.trustedProxy) delete request.headers['x-forwarded-for'];
    handle(request, response);
  });
  const app = next({
    dev: process.env.NODE_ENV !== 'production',
    hostname: settings.host,
    port: settings.port,
    httpServer,
  });

  // The stations first: whatever state they were left in, their supplies are switched off before a page is served.
  const live = await startLive({ httpServer, log });
  const printer = settings.demo ? await startDemoPrinter(settings.dataFolder) : null;
  const labels = startLabelSender({ db: database(), log });
  const dryRuns = await startDryRuns({ db: database(), log });
  const trail = startTrailKeeper({ db: database(), store: objectStore(), log });
  await app.prepare();
  const pages = app.getRequestHandler();
  handle = (request, response) => void pages(request, response);
  await new Promise<void>((resolve, reject) => {
    httpServer.once('error', reject);
    httpServer.listen(settings.port, settings.host, resolve);
  });
  console.log(greeting);

  let stopping = false;
  async function stop(): Promise<void> {
    if (stopping) return;
    stopping = true;
    await live.stop();
    await labels.stop();
    await dryRuns.stop();
    await trail.stop();
    await printer?.close();
    await storage?.close();
    httpServer.close();
    httpServer.closeAllConnections();
    await app.close();
    await closeSharedDatabases();
    process.exit(0);
  }
  process.on('SIGTERM', () => void stop());
  process.on('SIGINT', () => void stop());
  // The start command is gone: nobody could stop this process any more.
  process.on('disconnect', () => void stop());
}

main().catch((error: unknown) => {
  log.fatal(error);
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
});

import { createServer } from 'node:http';
import pino from 'pino';
import { startLive } from '@/server/live/start-live';

/** The stations and the gateway in a process of their own, to be killed. Its environment is the parent's. */
const httpServer = createServer((_, response) => response.end());
await new Promise<void>((resolve) => httpServer.listen(Number(process.env.PORT), '127.0.0.1', resolve));
await startLive({ httpServer, log: pino({ level: 'silent' }) });
process.stdout.write('ready\n');

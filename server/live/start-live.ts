import type { Server as HttpServer } from 'node:http';
import { join } from 'node:path';
import type { Logger } from 'pino';
import { watchSessions } from '../auth/watch-sessions';
import { environment } from '../environment';
import { Journal } from '../journal/journal';
import { RunRecorder } from '../journal/run-recorder';
import { recoverOpenRuns } from '../operations/runs/recover-open-runs';
import { database, listen } from '../postgres';
import { Gateway } from './gateway';
import { latestOf } from './latest';
import { LiveStation } from './live-station';
import { Registry } from './registry';

export interface Live {
  /** Every station's supply off with read-back first, then a clean stop. */
  stop(): Promise<void>;
}

/**
 * How often each station looks at where it stands with the server, and the server at the list of stations: for what no
 * notification tells, and what was missed while the connection was away.
 */
const lookEveryMs = 3_000;
/** Views of one station closer together than this are sent as one; the first goes at once. */
const viewsApartMs = 25;

/**
 * Starts the stations and what connects browsers to them. Supplies are off with read-back before anything else; then the
 * runs that a crash left open are closed, and only then may a screen connect.
 */
export async function startLive({ httpServer, log }: { httpServer: HttpServer; log: Logger }): Promise<Live> {
  const db = database();
  const { dataFolder, clockRate } = environment();
  const recorder = new RunRecorder(db, new Journal(join(dataFolder, 'journal')), log);
  let gateway: Gateway | null = null;

  const registry = new Registry({
    db,
    make(row) {
      const views = latestOf(viewsApartMs, (view) => gateway?.send(row.code, 'view', view));
      const hands = latestOf(viewsApartMs, (view) => gateway?.send(row.code, 'hands', view));
      return new LiveStation(row, {
        db,
        recorder,
        clockRate,
        log,
        onView: views,
        onHands: hands,
        onReading: (reading) => gateway?.sendReading(row.code, reading),
      });
    },
    onGone: (station) => gateway?.disconnect({ station }),
  });

  const supplies = await registry.start();
  await recorder.storeEnded();
  await recorder.handOverBroken();
  const recovered = await recoverOpenRuns(db, (stationId) => supplies.get(stationId) ?? { confirmed: false }, log);
  if (recovered > 0) log.warn({ recovered }, 'runs left open by a crash were closed without a verdict');

  const open = (gateway = new Gateway({ httpServer, log, stationByCode: (code) => registry.byCode(code) }));
  const refresh = () => Promise.all(registry.all().map((live) => live.station.refresh()));
  const sessions = await watchSessions({
    liveSessionIds: () => [...open.sessionIds(), ...registry.all().flatMap((live) => live.station.sessionId() ?? [])],
    onEnded(sessionId) {
      open.disconnect({ sessionId });
      for (const live of registry.all()) if (live.station.sessionId() === sessionId) void live.station.refresh();
    },
  });
  const enrolments = await listen('enrolment_revoked', (enrolmentId) => open.disconnect({ enrolmentId }));

  const standings = await listen(
    'standing_changed',
    (which) => {
      for (const { row, station } of registry.all()) if (which === '*' || which === row.id) void station.refresh();
    },
    () => void refresh(),
  );

  let looking: Promise<unknown> = refresh();
  const timer = setInterval(() => {
    looking = looking.then(async () => {
      await registry.follow().catch((error: unknown) => log.warn({ error }, 'the list of stations could not be read'));
      await refresh();
    });
  }, lookEveryMs);

  return {
    async stop() {
      clearInterval(timer);
      await registry.stop();
      await looking;
      open.close();
      await sessions.close();
      await enrolments.close();
      await standings.close();
    },
  };
}

import { isDeepStrictEqual } from 'node:util';
import type { Database } from '@/db/client';
import { listBenches, type BenchRow } from '@/db/queries/station-benches';
import type { SupplyFound } from '../operations/runs/recover-open-runs';
import type { LiveStation } from './live-station';

export interface RegistryOptions {
  db: Database;
  make(row: BenchRow): LiveStation;
  onGone(station: LiveStation): void;
}

/** What makes a station another station: everything but how its screen looks. */
const wiring = ({ scheme: _look, ...row }: BenchRow) => row;

/** The stations of this process: one object a configured station, however its configuration changes. */
export class Registry {
  private readonly stations = new Map<string, LiveStation>();
  private stopped = false;

  constructor(private readonly options: RegistryOptions) {}

  all(): LiveStation[] {
    return [...this.stations.values()];
  }

  byCode(code: string): LiveStation | null {
    return this.all().find(({ row }) => row.code === code) ?? null;
  }

  /** Opens every station; each one's supply is off, or not confirmed so, when this resolves. Keys are station ids. */
  async start(): Promise<Map<string, SupplyFound>> {
    const rows = await listBenches(this.options.db);
    const found = await Promise.all(rows.map(async (row) => [row.id, await this.add(row)] as const));
    return new Map(found);
  }

  /** Follows what the administrator changed. A station that is at work changes when it is free. */
  async follow(): Promise<void> {
    const rows = await listBenches(this.options.db);
    if (this.stopped) return;
    for (const live of this.all()) {
      const row = rows.find((each) => each.id === live.row.id);
      const unchanged = row && isDeepStrictEqual(wiring(row), wiring(live.row));
      if (!unchanged && !live.station.isBusy()) await this.remove(live);
    }
    await Promise.all(rows.filter((row) => !this.stations.has(row.id)).map((row) => this.add(row)));
  }

  /** Every supply off with read-back. */
  async stop(): Promise<void> {
    this.stopped = true;
    await Promise.all(this.all().map((live) => live.station.stop()));
  }

  private async add(row: BenchRow): Promise<SupplyFound> {
    const live = this.options.make(row);
    this.stations.set(row.id, live);
    return live.station.start();
  }

  private async remove(live: LiveStation): Promise<void> {
    this.stations.delete(live.row.id);
    this.options.onGone(live);
    live.leadership.stop();
    await live.station.stop();
  }
}

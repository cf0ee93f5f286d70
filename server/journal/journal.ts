import { mkdir, open, readdir, readFile, rename, rm, type FileHandle } from 'node:fs/promises';
import { join } from 'node:path';
import type { EventBatch, RunRecord } from '../operations/runs/run-record';

type Line = { batch: EventBatch } | { close: Omit<RunRecord, 'runId' | 'batches'> };

/** A run as its file tells it; `ending` is null when the program died before the run ended. */
export interface JournalledRun {
  runId: string;
  batches: EventBatch[];
  ending: Omit<RunRecord, 'runId' | 'batches'> | null;
}

/**
 * One file a run, lines only ever added, each on the disk before anybody is told so. Whatever happens to the database, the
 * run is in here until it is stored there.
 */
export class Journal {
  constructor(private readonly folder: string) {}

  /** Begins the file of a run. */
  async begin(runId: string): Promise<JournalFile> {
    await mkdir(this.folder, { recursive: true });
    return new JournalFile(await open(this.pathOf(runId), 'a'));
  }

  /** Every run that has a file. A last line cut short by a power cut is left out. */
  async list(): Promise<JournalledRun[]> {
    const names = await readdir(this.folder).catch(() => []);
    const ids = names.filter((name) => name.endsWith(suffix)).map((name) => name.slice(0, -suffix.length));
    return Promise.all(ids.map((runId) => this.read(runId)));
  }

  async read(runId: string): Promise<JournalledRun> {
    const run: JournalledRun = { runId, batches: [], ending: null };
    for (const text of (await readFile(this.pathOf(runId), 'utf8')).split('\n')) {
      const line = parse(text);
      if (!line) break;
      if ('batch' in line) run.batches.push(line.batch);
      else run.ending = line.close;
    }
    return run;
  }

  /** The run is stored: its file has done its work. */
  async forget(runId: string): Promise<void> {
    await rm(this.pathOf(runId), { force: true });
  }

  /** Nobody claims the run, as after the database was replaced: its file is kept under another name, for a person to look at. */
  async setAside(runId: string): Promise<void> {
    await rename(this.pathOf(runId), `${this.pathOf(runId)}.unclaimed`);
  }

  private pathOf(runId: string): string {
    return join(this.folder, runId + suffix);
  }
}
const suffix = '.jsonl';

function parse(text: string): Line | null {
  try {
    return JSON.parse(text) as Line;
  } catch {
    return null;
  }
}

export class JournalFile {
  constructor(private readonly file: FileHandle) {}

  async append(line: Line): Promise<void> {
    await this.file.appendFile(`${JSON.stringify(line)}\n`);
    await this.file.datasync();
  }

  async close(): Promise<void> {
    await this.file.close();
  }
}

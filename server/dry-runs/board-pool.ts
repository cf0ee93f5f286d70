import { Piscina } from 'piscina';
import type { Entry } from './entry';
import type { BoardsAnswer, BoardsTask } from './job';

/** Worker threads that test boards. */
export class BoardPool {
  private readonly pool: Piscina<BoardsTask, BoardsAnswer>;

  constructor({ path, execArgv }: Entry, workers: number) {
    this.pool = new Piscina({ filename: path, execArgv, minThreads: workers, maxThreads: workers });
  }

  run(task: BoardsTask): Promise<BoardsAnswer> {
    return this.pool.run(task);
  }

  close(): Promise<void> {
    return this.pool.destroy();
  }
}

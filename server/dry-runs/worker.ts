import { runDryBoard } from '@/stations/dry-run/run-board';
import type { BoardsAnswer, BoardsTask } from './job';

/** Runs in a piscina thread. */
export default function runBoards({ trial, from, to }: BoardsTask): BoardsAnswer {
  return Array.from({ length: to - from }, (_, i) => runDryBoard(trial, from + i));
}

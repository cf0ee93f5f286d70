import { runDryBoard } from '@/stations/dry-run/run-board';
import type { BoardsAnswer, BoardsTask } from './job';

/** Runs in a piscina thread. */
export default function runBoards({ trial, sequences, from, to }: BoardsTask): BoardsAnswer {
  const boards = Array.from({ length: to - from }, (_, i) => from + i);
  return sequences.map((sequence) => boards.map((index) => runDryBoard({ ...trial, sequence }, index)));
}

import { daysFrom } from './days';
import { driftingBoards } from './drifting-boards';

export const boardsPerDay = driftingBoards / 2;
export const minuteMs = 60_000;
export const hourMs = 60 * minuteMs;

/** Two shifts of a hundred and twenty boards, from seven o'clock; alone, station 2 takes no longer a board. */
export function testedAt(firstDay: Date, place: number): Date {
  const day = place <= boardsPerDay ? 0 : 1;
  const since = (place - 1 - day * boardsPerDay) * 3.9 * minuteMs;
  return new Date(daysFrom(firstDay, day).getTime() + 7 * hourMs + since);
}

export const endOfDay = (firstDay: Date, place: number) =>
  new Date(daysFrom(firstDay, place <= boardsPerDay ? 0 : 1).getTime() + 15 * hourMs);

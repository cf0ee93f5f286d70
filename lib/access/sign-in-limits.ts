/** At most this many failed tries are evaluated in the window, per account and station. */
export const mostTriesEvaluated = 10;
export const triesWindowMs = 15 * 60_000;

const longestWaitMs = 300_000;

/** The wait after so many failures in a row: none after the first, then 2 s, 4 s, 8 s … up to 5 minutes. */
export function waitAfterFailuresMs(failures: number): number {
  return failures < 2 ? 0 : Math.min(1000 * 2 ** (failures - 1), longestWaitMs);
}

/** One evaluated try. */
export interface EvaluatedTry {
  atMs: number;
  succeeded: boolean;
}

/**
 * When the next try may be evaluated, in the same milliseconds; at or before `nowMs` means now. `tries` are those of one
 * account at one station, in any order. A success ends the growing waits, but failures count toward ten until they are
 * 15 minutes old: knowing the secret once does not give a guesser more tries.
 */
export function nextTryAtMs(tries: readonly EvaluatedTry[], nowMs: number): number {
  const recent = tries.filter((t) => t.atMs > nowMs - triesWindowMs).sort((a, b) => a.atMs - b.atMs);
  const failures = recent.filter((t) => !t.succeeded);
  const lastSuccess = recent.findLastIndex((t) => t.succeeded);
  const inARow = recent.slice(lastSuccess + 1);
  const afterWait = inARow.length === 0 ? nowMs : inARow.at(-1)!.atMs + waitAfterFailuresMs(inARow.length);
  const tenthLast = failures.at(-mostTriesEvaluated);
  const afterWindow = tenthLast ? tenthLast.atMs + triesWindowMs : nowMs;
  return Math.max(nowMs, afterWait, afterWindow);
}

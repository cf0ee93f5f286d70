import type { Clock } from './clock';

/** A clock's `sleep`, made of its `after`. */
export function sleepOn(after: Clock['after'], ms: number, signal?: AbortSignal): Promise<void> {
  if (!signal) return new Promise((resolve) => after(ms, resolve));
  return new Promise((resolve, reject) => {
    if (signal.aborted) return reject(signal.reason);
    const stop = () => {
      cancel();
      reject(signal.reason);
    };
    const cancel = after(ms, () => {
      signal.removeEventListener('abort', stop);
      resolve();
    });
    signal.addEventListener('abort', stop, { once: true });
  });
}

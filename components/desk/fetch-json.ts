/** Reads JSON from one of our own addresses; an answer that is not 200 is an error, so that old data stays on the page. */
export async function fetchJson<T>(address: string, signal?: AbortSignal): Promise<T> {
  const response = await fetch(address, { signal, cache: 'no-store' });
  if (!response.ok) throw new Error(`${address} answered ${response.status}`);
  return (await response.json()) as T;
}

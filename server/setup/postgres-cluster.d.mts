export function findFreePort(): Promise<number>;
export function startCluster(
  folder: string,
  options?: { fast?: boolean },
): Promise<{ startedHere: boolean; url: string; stop: () => Promise<void> }>;
export function postgresCanUse(folder: string): boolean;

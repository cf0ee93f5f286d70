import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** The secret that signs session cookies, made once and kept in the data folder, readable by its owner only. */
export function localSecret(dataFolder: string): string {
  const path = join(dataFolder, 'session-secret');
  if (!existsSync(path)) writeFileSync(path, randomBytes(48).toString('base64url'), { mode: 0o600 });
  return readFileSync(path, 'utf8').trim();
}

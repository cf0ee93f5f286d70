import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { runCommand } from './run-command.mjs';

const stamp = 'node_modules/.installed-lock';

function lockHash() {
  return createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');
}

/** Whether node_modules matches the lock file. */
export function packagesAreCurrent() {
  return existsSync(stamp) && readFileSync(stamp, 'utf8') === lockHash();
}

/** Installs exactly what the lock file says, development packages included, since the build and the tests need them. */
export async function installPackages() {
  await runCommand('npm', ['ci', '--include=dev', '--no-audit', '--no-fund']);
  writeFileSync(stamp, lockHash());
}

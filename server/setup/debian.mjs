import { existsSync, readdirSync } from 'node:fs';
import { runCommand } from './run-command.mjs';

/** Installs Debian packages; needs root. Recommended packages are left out. */
export async function installDebianPackages(names) {
  if (process.getuid?.() !== 0)
    throw new Error(
      `These Debian packages are missing: ${names.join(', ')}. Install them with apt-get as root, then start again.`,
    );
  const environment = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  await runCommand('apt-get', ['update'], { env: environment });
  await runCommand('apt-get', ['install', '-y', '--no-install-recommends', ...names], { env: environment });
}

/** The newest PostgreSQL's program folder, or null when Debian's packages are not installed. */
export function findPostgresPrograms() {
  const root = '/usr/lib/postgresql';
  if (!existsSync(root)) return null;
  const versions = readdirSync(root)
    .filter((version) => existsSync(`${root}/${version}/bin/initdb`))
    .sort((a, b) => Number(b) - Number(a));
  return versions[0] ? `${root}/${versions[0]}/bin` : null;
}

// The test command: installs what is missing, then every check. Ends non-zero when any fails; last line: "N passed, N failed".
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { installDebianPackages } from '../server/setup/debian.mjs';
import { installPackages, packagesAreCurrent } from '../server/setup/packages.mjs';
import { giveUp, step } from '../server/setup/progress.mjs';
import { runCommand } from '../server/setup/run-command.mjs';

process.chdir(fileURLToPath(new URL('..', import.meta.url)));
if (process.argv.includes('--nightly')) process.env.SILLWRIGHT_NIGHTLY = '1';

const programs = [
  ['/usr/bin/chromium', 'chromium'],
  ['/usr/bin/socat', 'socat'],
  ['/usr/bin/ngspice', 'ngspice'],
  ['/usr/bin/zbarimg', 'zbar-tools'],
  ['/usr/lib/postgresql', 'postgresql'],
  ['/usr/bin/Rscript', 'r-base-core'],
];
const reports = '.sillwright/test-reports';
const bin = (name) => `node_modules/.bin/${name}`;
let passed = 0;
let failed = 0;

/** One check that either holds or prints why not. */
async function check(title, work) {
  const began = performance.now();
  const seconds = () => ((performance.now() - began) / 1000).toFixed(1);
  try {
    await work();
    passed += 1;
    console.log(`  ok      ${title} (${seconds()} s)`);
    return true;
  } catch (error) {
    failed += 1;
    console.log(`  FAILED  ${title} (${seconds()} s)\n${error.message}`);
    return false;
  }
}

/** A vitest run; its tests count one by one. */
async function suite(title, name, args) {
  const report = `${reports}/${name}.json`;
  rmSync(report, { force: true });
  const began = performance.now();
  const ended = await runCommand(
    bin('vitest'),
    ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${report}`, ...args],
    {
      show: true,
    },
  ).catch((error) => error);
  const counts = existsSync(report) ? JSON.parse(readFileSync(report, 'utf8')) : null;
  passed += counts?.numPassedTests ?? 0;
  failed += counts?.numFailedTests ?? 0;
  // A file that did not load, or a run that ended early, has no failing test of its own.
  if (ended instanceof Error && !counts?.numFailedTests) failed += 1;
  console.log(`  ${title}: ${((performance.now() - began) / 1000).toFixed(1)} s`);
}

const missing = programs.filter(([path]) => !existsSync(path)).map(([, name]) => name);
if (missing.length > 0)
  await step(`Installing Debian packages: ${missing.join(', ')}`, () => installDebianPackages(missing)).catch((error) =>
    giveUp(error.message),
  );
if (!packagesAreCurrent()) await step('Installing packages', installPackages).catch((error) => giveUp(error.message));
mkdirSync(reports, { recursive: true });

await check('format', () => runCommand(bin('prettier'), ['--check', '--log-level=warn', '.']));
await check('lint and import table', () => runCommand(bin('eslint'), ['--max-warnings=0', '.']));
await check('types', async () => {
  await runCommand(bin('next'), ['typegen']);
  await runCommand(bin('tsc'), ['--noEmit']);
});
await suite('unit, property, reference and database tests', 'unit', []);
const { build, buildIsCurrent } = await import('../server/setup/build.mjs');
if (await check('production build', () => (buildIsCurrent() ? undefined : build())))
  await suite('browser tests', 'browser', ['--config', 'tests/browser/vitest.config.ts']);

console.log(`${passed} passed, ${failed} failed`);
process.exit(failed === 0 ? 0 : 1);

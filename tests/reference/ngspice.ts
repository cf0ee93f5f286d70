import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** Runs a netlist of `netlists/` in Debian's ngspice, its `{{names}}` filled in by numbers or lines, and returns what `.meas` found. */
export function runNetlist(name: string, values: Record<string, number | string>): Record<string, number> {
  const path = fileURLToPath(new URL(`./netlists/${name}.cir`, import.meta.url));
  const netlist = readFileSync(path, 'utf8').replace(/\{\{(\w+)\}\}/g, (_whole, key: string) => {
    const value = values[key];
    if (value === undefined) throw new Error(`The netlist ${name} needs ${key}.`);
    return typeof value === 'string' ? value : value.toExponential(12);
  });
  const folder = mkdtempSync(join(tmpdir(), 'ngspice-'));
  const filled = join(folder, `${name}.cir`);
  writeFileSync(filled, netlist);
  const run = spawnSync('ngspice', ['-b', filled], { encoding: 'utf8' });
  rmSync(folder, { recursive: true });
  if (run.error) throw run.error;
  const found: Record<string, number> = {};
  for (const [, key, value] of run.stdout.matchAll(/^(\w+)\s*=\s*([-+\d.eE]+)/gm)) found[key!] = Number(value);
  return found;
}

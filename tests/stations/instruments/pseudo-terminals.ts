import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

export interface PseudoTerminal {
  /** The station's end and the instrument's end. */
  station: string;
  instrument: string;
  /** Both ends vanish, as with a pulled cable. */
  pull(): Promise<void>;
}

/** A pair of joined pseudo-terminals made by Debian's socat, as two ends of a serial cable. */
export async function layCable(name: string): Promise<PseudoTerminal> {
  const folder = mkdtempSync(join(tmpdir(), `cable-${name}-`));
  const [station, instrument] = [join(folder, 'station'), join(folder, 'instrument')];
  const socat = spawn('socat', [`pty,raw,echo=0,link=${station}`, `pty,raw,echo=0,link=${instrument}`], {
    stdio: 'ignore',
  });
  const gone = new Promise<void>((resolve) => socat.once('exit', () => resolve()));
  const failed = new Promise<never>((_resolve, reject) => socat.once('error', reject));
  const there = async () => {
    while (!existsSync(station) || !existsSync(instrument)) await new Promise((resolve) => setTimeout(resolve, 10));
  };
  await Promise.race([there(), failed]);
  return {
    station,
    instrument,
    async pull() {
      socat.kill();
      await gone;
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

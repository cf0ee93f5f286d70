import type { UnitPage } from './unit-page';

/** A cell that holds a comma, quote or line end is quoted (RFC 4180). */
const cell = (text: string) => (/[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text);

/** Every reading of a board, one a line, oldest attempt first, engineering runs named as such. Seconds since the run began, volts; output on, off or empty. */
export function readingsAsCsv(unit: Pick<UnitPage, 'serial' | 'runs'>): string {
  const lines = ['serial,run,attempt,part,seconds,volts,output'];
  for (const run of [...unit.runs].reverse())
    for (const { kind, atMs, volts, output } of run.traces)
      atMs.forEach((ms, i) => {
        const state = output[i] === 1 ? 'on' : output[i] === 0 ? 'off' : '';
        lines.push(
          [
            cell(unit.serial),
            run.kind,
            run.attempt,
            cell(kind),
            (ms / 1000).toFixed(3),
            volts[i]!.toFixed(5),
            state,
          ].join(','),
        );
      });
  return `${lines.join('\r\n')}\r\n`;
}

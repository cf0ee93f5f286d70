import { startBoard } from './board-start';
import { readScan, type ScanCode } from './scan-code';
import { say } from './sayings';
import { askServer, refuse } from './step';
import type { BenchPhase, BenchState, BenchStep } from './types';

/** A scan starts, confirms a bin, or is refused with a reason. */
export function takeScan(state: BenchState, text: string, byHand: boolean, atIso: string): BenchStep {
  const scan = readScan(text);
  const { phase } = state;
  switch (phase.kind) {
    case 'badge':
    case 'pin':
      if (scan.kind !== 'badge') return refuse(state, say('sign-in-first'), atIso);
      return askServer(state, { kind: 'badge', badgeCode: scan.code, byHand });
    case 'run':
      return refuseDuringRun(state, phase, scan, atIso);
    case 'bin':
      return takeBinScan(state, phase, scan, atIso);
    case 'commissioning':
      if (phase.state !== 'seat' || scan.kind !== 'serial') return refuse(state, say('not-now'), atIso);
      return askServer(state, { kind: 'reference', code: scan.code });
    case 'choose-lot':
    case 'idle':
    case 'over':
    case 'daily-check':
      return takeIdleScan(state, scan, byHand, atIso);
  }
}

function takeIdleScan(state: BenchState, scan: ScanCode, byHand: boolean, atIso: string): BenchStep {
  switch (scan.kind) {
    case 'badge':
      return refuse(state, say('end-shift-first', { operator: state.operator?.number ?? '' }), atIso);
    case 'lot':
      return askServer(state, { kind: 'lot', by: { code: scan.short } });
    case 'bin':
      return refuse(state, say('no-bin-needed'), atIso);
    case 'serial':
      return startBoard(state, scan.code, byHand, atIso);
  }
}

type Phase<K extends BenchPhase['kind']> = Extract<BenchPhase, { kind: K }>;

function refuseDuringRun(state: BenchState, phase: Phase<'run'>, scan: ScanCode, atIso: string): BenchStep {
  if (scan.kind === 'bin') return refuse(state, say('no-bin-needed'), atIso);
  if (scan.kind !== 'serial') return refuse(state, say('finish-board-first', { serial: phase.serial }), atIso);
  if (scan.code === phase.serial) return refuse(state, say('already-testing', { serial: phase.serial }), atIso);
  return refuse(state, say('other-board', { scanned: scan.code, held: phase.serial }), atIso, scan.code);
}

/** After a reject nothing but the code of its bin is taken. */
function takeBinScan(state: BenchState, phase: Phase<'bin'>, scan: ScanCode, atIso: string): BenchStep {
  const bin = readScan(phase.bin.binCode).short;
  if (scan.kind !== 'bin') return refuse(state, say('bin-first', { bin }), atIso);
  if (scan.code !== phase.bin.binCode.toUpperCase())
    return refuse(state, say('wrong-bin', { scanned: scan.short, bin }), atIso);
  if (state.ready.databaseAway) return refuse(state, say('database-away'), atIso);
  return askServer(state, { kind: 'bin', runId: phase.bin.runId, binCode: scan.code });
}

/** A serial typed twice stands for a scan. */
export function takeTypedSerial(state: BenchState, serial: string, again: string, atIso: string): BenchStep {
  const [first, second] = [readScan(serial), readScan(again)];
  if (first.code !== second.code) return refuse(state, say('serials-differ'), atIso);
  if (first.kind !== 'serial') return refuse(state, say('serial-wrong-form', { serial: first.code }), atIso);
  return takeScan(state, first.code, true, atIso);
}

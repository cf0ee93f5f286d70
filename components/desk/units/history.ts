import type { UnitPage, UnitRun } from '@/lib/contracts/unit-page';
import { volts } from '../numbers';
import { dispositionWords, noVerdictWords, rejectWords } from '../words';
import { adjustmentText } from './turn-text';

export interface HistoryEntry {
  key: string;
  iso: string;
  text: string;
}

const after = (iso: string, ms: number) => new Date(Date.parse(iso) + ms).toISOString();

function endText(run: UnitRun): string {
  const last = (quantity: string) => run.measurements.findLast((m) => m.quantity === quantity)?.value ?? null;
  const [trip, release] = [last('trip-volts'), last('release-volts')];
  const values = [trip !== null ? `Trip ${volts(trip)} V` : '', release !== null ? `release ${volts(release)} V` : '']
    .filter(Boolean)
    .join(', ');
  const lead = values ? `${values}. ` : '';
  if (run.verdict === 'pass') return `${lead}Passed`;
  if (run.verdict === 'reject') return `${lead}${run.rejectReason ? `${rejectWords[run.rejectReason]}. ` : ''}Rejected`;
  return `${run.noVerdictReason ? `${noVerdictWords(run.noVerdictReason)}. ` : ''}No verdict`;
}

/** Everything that happened to a board, newest first. */
export function historyOf(unit: UnitPage): HistoryEntry[] {
  const entries: HistoryEntry[] = [];
  for (const run of unit.runs) {
    const lead = run.kind === 'engineering' ? 'Engineering run. ' : '';
    entries.push({
      key: `${run.id} start`,
      iso: run.startedIso,
      text: `${lead}Scanned at station ${run.stationCode}, sequence ${run.sequenceRevision}`,
    });
    run.adjustments.forEach((adjustment, i) =>
      entries.push({
        key: `${run.id} ${i}`,
        iso: after(run.startedIso, adjustment.atMs),
        text: adjustmentText(adjustment),
      }),
    );
    if (run.endedIso) entries.push({ key: `${run.id} end`, iso: run.endedIso, text: lead + endText(run) });
    if (run.binScannedIso)
      entries.push({ key: `${run.id} bin`, iso: run.binScannedIso, text: `Put in bin ${run.binCode ?? ''}` });
  }
  for (const label of unit.labels) {
    const at = label.printerName ? ` at ${label.printerName}` : '';
    if (label.printedIso) entries.push({ key: label.id, iso: label.printedIso, text: `Label printed${at}` });
    else
      entries.push({
        key: label.id,
        iso: label.createdIso,
        text: label.state === 'failed' ? `Label not printed. ${label.problem ?? ''}` : `Label waits${at}`,
      });
  }
  for (const d of unit.dispositions) {
    const what = dispositionWords[d.kind].toLowerCase();
    entries.push({
      key: d.id,
      iso: d.signedIso,
      text: `${d.signedByName}: ${what}${d.action ? `, ${d.action}` : ''}. ${d.reason}`,
    });
    const second = d.signatures[1];
    if (second) entries.push({ key: `${d.id} 2`, iso: second.signedIso, text: `${second.name} agreed: ${what}` });
  }
  for (const order of unit.retestOrders)
    entries.push({
      key: order.id,
      iso: order.signedIso,
      text: `${order.signedByName} ordered a retest. ${order.reason}`,
    });
  return entries.sort((a, b) => b.iso.localeCompare(a.iso));
}

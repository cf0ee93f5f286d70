import type { Database, Transaction } from '@/db/client';
import {
  listCertifiedDecisions,
  listCertifiedRuns,
  listCertifiedValues,
  listStepsOfRun,
} from '@/db/queries/certified-runs';
import type { UnitRecord } from '@/db/queries/unit-records';
import { canonicalJson } from '@/lib/canonical-json';
import { inReadingOrder } from '@/lib/certificate/value-text';
import { ruleSentence } from '@/lib/certificate/certificate-words';
import { isCertifiable } from '@/lib/certificate/certifiable';
import type { CertificateContent, CertifiedBoard, CertifiedValue } from '@/lib/contracts/certificate';
import type { Measurement, RejectReason } from '@/lib/run/types';
import type { Step } from '@/lib/sequence/step';
import { readBenchHistory } from './certified-benches';

type Heading = Pick<CertificateContent, 'kind' | 'boardTypeCode' | 'boardTypeName' | 'sequenceName' | 'lotCode'>;

const ofLot: Measurement['quantity'][] = ['trip-volts', 'release-volts', 'hysteresis-volts'];

/** What a certificate of these boards states. Boards that it does not cover are only counted. */
export async function certificateContent(
  db: Database | Transaction,
  heading: Heading,
  records: readonly UnitRecord[],
): Promise<CertificateContent> {
  const covered = records.filter(isCertifiable).map((record) => ({
    record,
    runId: record.runs.findLast(({ verdict }) => verdict === 'pass' || verdict === 'reject')!.id,
  }));
  const runIds = covered.map(({ runId }) => runId);
  const single = heading.kind === 'board';
  const [runs, values, decisions, benchOf, steps] = await Promise.all([
    listCertifiedRuns(db, runIds),
    listCertifiedValues(db, runIds, single ? null : ofLot),
    listCertifiedDecisions(
      db,
      covered.map(({ record }) => record.unitId),
    ),
    readBenchHistory(db),
    single ? listStepsOfRun(db, runIds[0]!) : [],
  ]);
  const runOf = new Map(runs.map((run) => [run.id, run]));
  const valuesOf = byRun(values);
  const decisionsOf = byRun(decisions);
  const benches = new Places<CertificateContent['benches'][number]>();
  const procedures = new Places<CertificateContent['procedures'][number]>();
  const boards = covered.map(({ record, runId }): CertifiedBoard => {
    const run = runOf.get(runId)!;
    const conceded = decisionsOf.get(runId)?.find(({ kind }) => kind === 'concession');
    return {
      serial: record.serial,
      runId,
      testedAtIso: run.endedAt!.toISOString(),
      attempt: run.attempt,
      operatorNumber: run.operatorNumber,
      bench: benches.of(benchOf(run)),
      procedure: procedures.of({
        sequenceRevision: run.sequenceRevision,
        decisionRule: ruleSentence(run.decisionRule),
      }),
      values: certifiedValues(valuesOf.get(runId) ?? [], steps),
      earlier: record.runs
        .map(({ id, verdict, rejectReason }, i) => ({
          id,
          attempt: i + 1,
          reason: verdict === 'reject' ? (rejectReason as RejectReason) : null,
          reworked: decisionsOf.get(id)?.findLast(({ kind }) => kind === 'rework')?.action ?? null,
        }))
        .filter(({ attempt }) => attempt < run.attempt)
        .map(({ id: _id, ...earlier }) => earlier),
      concession: conceded
        ? {
            reason: conceded.reason,
            signatures: conceded.signatures.map(({ name, meaning, signedAt }) => ({
              name,
              meaning,
              atIso: signedAt.toISOString(),
            })),
          }
        : null,
    };
  });
  return {
    ...heading,
    benches: benches.all,
    procedures: procedures.all,
    boards,
    counts: single ? null : countsOf(boards, records.length),
  };
}

function countsOf(boards: readonly CertifiedBoard[], made: number): NonNullable<CertificateContent['counts']> {
  const passed = boards.filter(({ concession }) => concession === null);
  const first = passed.filter(({ earlier }) => earlier.every(({ reason }) => reason === null)).length;
  return {
    boards: made,
    firstPass: first,
    laterPass: passed.length - first,
    concessions: boards.length - passed.length,
    apart: made - boards.length,
  };
}

/** The last result of each quantity that was judged; quantities that belong to a step once for each step. */
function certifiedValues(
  measured: Awaited<ReturnType<typeof listCertifiedValues>>,
  steps: readonly Step[],
): CertifiedValue[] {
  const last = new Map<string, CertifiedValue>();
  for (const m of measured) {
    if (m.passed === null || m.phase === 'found') continue;
    const own = m.quantity === 'channel-volts' || m.quantity === 'drift-volts' || m.quantity === 'operator-check';
    const key = own ? `${m.quantity} ${m.stepIndex}` : m.quantity;
    const { quantity, value, standardUncertainty: u, expandedUncertainty, min, max, passed } = m;
    const step = own ? (steps[m.stepIndex]?.name ?? '') : '';
    const coverageFactor = u && expandedUncertainty ? expandedUncertainty / u : null;
    last.delete(key);
    last.set(key, { quantity, step, value, expandedUncertainty, coverageFactor, min, max, passed });
  }
  return inReadingOrder([...last.values()]);
}

function byRun<Row extends { runId: string }>(rows: readonly Row[]): Map<string, Row[]> {
  const groups = new Map<string, Row[]>();
  for (const row of rows) {
    const group = groups.get(row.runId);
    if (group) group.push(row);
    else groups.set(row.runId, [row]);
  }
  return groups;
}

/** Different things, each kept once and known by its place. */
class Places<Thing extends object> {
  readonly all: Thing[] = [];
  private readonly known = new Map<string, number>();

  of(thing: Thing): number {
    const key = canonicalJson(thing);
    const place = this.known.get(key) ?? this.all.push(thing) - 1;
    this.known.set(key, place);
    return place;
  }
}

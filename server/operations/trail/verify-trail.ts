import type { Database } from '@/db/client';
import {
  countUnsealed,
  listChainHeads,
  listCheckpoints,
  listSealedEntries,
  type SealedEntry,
} from '@/db/queries/trail-chain';
import { sealText } from '@/lib/trail/seal-text';
import { digestOfRun } from './seal-run';
import { sha256 } from './sha256';

/** A head as it was sent out, from the database or from a copy outside it. */
export interface KnownHead {
  chain: string;
  place: number;
  seal: string;
  /** Where it was kept: the database, object storage, a mail. */
  from: string;
}

/** The first thing wrong in a chain. `place` is where, from 1. */
export interface ChainBreak {
  chain: string;
  place: number;
  sentence: string;
}

export interface TrailReport {
  chains: { chain: string; entries: number; broken: ChainBreak | null }[];
  entries: number;
  runs: number;
  breaks: ChainBreak[];
}

export interface VerifyOptions {
  /** Heads kept elsewhere; those of the database are always compared. */
  known?: readonly KnownHead[];
  /** Also whether the hash of every closed run still fits its record. */
  runs?: boolean;
  onProgress?(entries: number): void;
}

const batch = 5_000;

/**
 * Recomputes every seal outside the database and compares the chains with every head that was sent out. Finds an entry altered,
 * removed or reordered, a chain cut off or written anew, and a record of a closed run that changed.
 */
export async function verifyTrail(db: Database, options: VerifyOptions = {}): Promise<TrailReport> {
  const stored = (await listCheckpoints(db)).map((head) => ({ ...head, from: 'the database' }));
  const known = [...stored, ...(options.known ?? [])];
  const names = new Set([...(await listChainHeads(db)).map(({ chain }) => chain), ...known.map(({ chain }) => chain)]);
  const report: TrailReport = { chains: [], entries: 0, runs: 0, breaks: [] };
  for (const chain of [...names].sort()) {
    const heads = known.filter((head) => head.chain === chain);
    const checked = await verifyChain(db, chain, heads, report, options);
    report.chains.push(checked);
    if (checked.broken) report.breaks.push(checked.broken);
  }
  const unsealed = await countUnsealed(db);
  if (unsealed > 0)
    report.breaks.push({ chain: 'none', place: 0, sentence: `${unsealed} entries were written without a seal.` });
  return report;
}

async function verifyChain(
  db: Database,
  chain: string,
  heads: readonly KnownHead[],
  report: TrailReport,
  options: VerifyOptions,
): Promise<TrailReport['chains'][number]> {
  let place = 0;
  let seal: string | null = null;
  const broken = (at: number, sentence: string) => ({ chain, entries: place, broken: { chain, place: at, sentence } });
  for (;;) {
    const entries = await listSealedEntries(db, chain, place, batch);
    for (const entry of entries) {
      const wrong = wrongWith(entry, place, seal, heads) ?? (options.runs ? await wrongRun(db, entry, report) : null);
      if (wrong) return broken(entry.place, wrong);
      place = entry.place;
      seal = entry.seal;
      report.entries++;
    }
    options.onProgress?.(report.entries);
    if (entries.length < batch) break;
  }
  const beyond = heads.find((head) => head.place > place);
  return beyond
    ? broken(place, `The chain ends at entry ${place}, but entry ${beyond.place} is known from ${beyond.from}.`)
    : { chain, entries: place, broken: null };
}

function wrongWith(
  entry: SealedEntry,
  placeBefore: number,
  sealBefore: string | null,
  heads: readonly KnownHead[],
): string | null {
  if (entry.place !== placeBefore + 1)
    return `Entries ${placeBefore + 1} to ${entry.place - 1} are missing before entry ${entry.place}.`;
  if (sha256(sealText(sealBefore, entry)) !== entry.seal)
    return `Entry ${entry.place} does not fit its seal: it, or the one before it, was altered.`;
  const other = heads.find((head) => head.place === entry.place && head.seal !== entry.seal);
  return other
    ? `Entry ${entry.place} has another seal than the one known from ${other.from}: the chain was written anew.`
    : null;
}

async function wrongRun(db: Database, entry: SealedEntry, report: TrailReport): Promise<string | null> {
  if (entry.action !== 'run.closed') return null;
  report.runs++;
  const said = (JSON.parse(entry.after ?? '{}') as { digest?: string; serial?: string }) ?? {};
  const digest = await digestOfRun(db, entry.entityId);
  if (digest === said.digest) return null;
  return digest === null
    ? `The run of board ${said.serial} that entry ${entry.place} closes is gone.`
    : `The record of the run of board ${said.serial} changed after entry ${entry.place} closed it.`;
}

import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { accounts } from '@/db/schema/accounts';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';
import { cb1210 } from '@/db/seed/board-types';
import { seedRevisions, historyOf } from '@/db/seed/sequence-history';
import { sequences as seeded } from '@/db/seed/sequences';
import type { Actor } from '@/lib/access/actor';
import type { Outcome } from '@/lib/contracts/outcome';
import { discardDraft } from '@/server/operations/engineering/sequences/discard-draft';
import { exportSequence } from '@/server/operations/engineering/sequences/export-sequence';
import { importSequence } from '@/server/operations/engineering/sequences/import-sequence';
import { listSequencesForDesk } from '@/server/operations/engineering/sequences/list-sequences';
import { readComparison } from '@/server/operations/engineering/sequences/read-comparison';
import { readHistory } from '@/server/operations/engineering/sequences/read-history';
import { insertAccount } from '../../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../../database/temporary-postgres';
import { actorOf } from '../../desk/bases';

let open: TemporaryDatabase;
let engineer: Actor;
let second: Actor;
let quality: Actor;
let trimId: string;
let waitingId: string;

/** The demo's two histories, without the rest of the demo. */
beforeAll(async () => {
  open = await temporaryDatabase();
  engineer = actorOf(await insertAccount(open.db, ['test-engineer'], { name: 'T. Marsden' }));
  second = actorOf(await insertAccount(open.db, ['test-engineer'], { name: 'K. Osei' }));
  quality = actorOf(await insertAccount(open.db, ['quality-manager'], { name: 'A. Boyle' }));
  const people = {
    engineerId: engineer.accountId,
    secondEngineerId: second.accountId,
    qualityId: quality.accountId,
    administratorId: quality.accountId,
  };
  const [type] = await open.db.insert(boardTypes).values({ code: cb1210.code, name: cb1210.name }).returning();
  await open.db.insert(boardTypeRevisions).values({
    boardTypeId: type!.id,
    number: 1,
    specification: cb1210,
    status: 'approved',
    madeBy: engineer.accountId,
    approvedBy: quality.accountId,
  });
  const seed = (name: string, as = name) =>
    open.db.transaction(async (tx) => {
      const [row] = await tx.insert(sequences).values({ boardTypeId: type!.id, name: as }).returning();
      const history = historyOf(name, seeded[0]!.sequence);
      await seedRevisions(tx, { sequenceId: row!.id, history, people, now: new Date() });
      return row!.id;
    });
  trimId = await seed('CB1210 cutoff trim');
  waitingId = await seed('CB2420 cutoff trim', 'Waits for release');
});
afterAll(() => open.close());

function valueOf<T>(outcome: Outcome<T>): T {
  if (!outcome.ok) throw new Error(`${outcome.code}: ${outcome.sentence}`);
  return outcome.value;
}
const exported = async (number = 2) => (await exportSequence(trimId, number))!;
const discardWork = async (sequenceId: string) => {
  const drafts = await open.db.select().from(sequenceRevisions).where(eq(sequenceRevisions.sequenceId, sequenceId));
  for (const { id, status } of drafts)
    if (status === 'draft') valueOf(await discardDraft(engineer, { revisionId: id, reason: 'Makes place.' }));
};

describe('the list of sequences', () => {
  test('says what is in use and what is in work, and by whom', async () => {
    expect(await listSequencesForDesk()).toMatchObject([
      { name: 'CB1210 cutoff trim', inUse: { number: 2, by: 'K. Osei' }, draft: { number: 3, state: 'draft' } },
      { name: 'Waits for release', inUse: { number: 1 }, draft: { number: 2, state: 'submitted', by: 'K. Osei' } },
    ]);
  });
});

describe('the history of a sequence', () => {
  test('tells every revision, newest first, with what changed from the one it began from', async () => {
    const { entries } = (await readHistory(engineer, trimId))!;
    expect(entries.map(({ head, comparedWith, changes }) => [head.number, comparedWith, changes.length])).toEqual([
      [3, 2, 3],
      [2, 1, 2],
      [1, null, 0],
    ]);
    expect(entries[1]!.changes).toContain('Step 5, Trim: tolerance 30 mV is now 20 mV.');
    expect(entries[1]!.head).toMatchObject({ madeBy: 'T. Marsden', releasedBy: 'K. Osei', basedOnNumber: 1 });
  });

  test('offers the release to whoever did not write it', async () => {
    const offered = async (who: Actor) => (await readHistory(who, waitingId))!.entries[0]!.mayRelease;
    expect([await offered(engineer), await offered(second), await offered(quality)]).toEqual([true, false, true]);
  });
});

describe('a comparison', () => {
  test('shows the one in use and what is in work, unless the address names others', async () => {
    const numbers = async (a: string | null, b: string | null) => {
      const page = await readComparison(engineer, trimId, { a, b });
      return page && [page.a.head.number, page.b.head.number];
    };
    expect(await numbers(null, null)).toEqual([2, 3]);
    expect(await numbers('r1', 'r2')).toEqual([1, 2]);
    expect(await numbers('r9', null)).toBeNull();
  });

  test('lets the writer take back and others release, and neither when nothing waits', async () => {
    const may = async (who: Actor, id = waitingId) => {
      const page = (await readComparison(who, id, { a: null, b: null }))!;
      return [page.mayRelease, page.mayTakeBack];
    };
    expect(await may(second)).toEqual([false, true]);
    expect(await may(quality)).toEqual([true, false]);
    expect(await may(quality, trimId)).toEqual([false, false]);
  });
});

describe('export and import', () => {
  test('bring a revision back as a draft of the same sequence, with the same steps', async () => {
    const { fileName, text } = await exported();
    expect(fileName).toBe('CB1210-cutoff-trim-r2.json');
    expect(await importSequence(second, { text, sequenceId: null })).toMatchObject({ ok: false, code: 'draft-exists' });
    await discardWork(trimId);
    const made = valueOf(await importSequence(second, { text, sequenceId: null }));
    expect(made).toEqual({ made: true, sequenceId: trimId, number: 4 });
    const { entries } = (await readHistory(second, trimId))!;
    expect(entries[0]!.head).toMatchObject({
      status: 'draft',
      madeBy: 'K. Osei',
      note: 'From a file of CB1210 cutoff trim r2.',
    });
    expect((await exported(4)).text.replace('"revision": 4', '"revision": 2')).toBe(text);
  });

  test('make a sequence where there is none of that name', async () => {
    const text = (await exported()).text.replace('"CB1210 cutoff trim"', '"CB1210 short trim"');
    expect(valueOf(await importSequence(second, { text, sequenceId: null }))).toMatchObject({ made: true, number: 1 });
  });

  test('store nothing of a bad file, and say every line', async () => {
    const before = await open.db.$count(sequenceRevisions);
    const text = (await exported()).text
      .replace('"mostRounds": 8', '"mostRounds": "8"')
      .replace('"repeats": 3', '"repeats": 30');
    const answer = valueOf(await importSequence(second, { text, sequenceId: null }));
    expect(answer).toMatchObject({
      made: false,
      problems: [{ field: 'step 5, mostRounds' }, { field: 'step 7, repeats', reason: 'It must be at most 10.' }],
    });
    expect(await open.db.$count(sequenceRevisions)).toBe(before);
  });

  test('tell what only this server can know: the board type, the sequence it goes into', async () => {
    const { text } = await exported();
    const problemsOf = async (changed: string, sequenceId: string | null) => {
      const answer = valueOf(await importSequence(second, { text: changed, sequenceId }));
      return answer.made ? [] : answer.problems;
    };
    const other = text.replace('"boardType": "CB1210"', '"boardType": "CB9999"');
    expect(await problemsOf(other, null)).toEqual([
      { line: 4, field: 'boardType', reason: 'There is no board type CB9999 here.' },
    ]);
    expect(await problemsOf(other, trimId)).toEqual([
      { line: 4, field: 'boardType', reason: 'This sequence is for CB1210, the file for CB9999.' },
    ]);
    expect(await open.db.$count(accounts)).toBe(3);
  });

  test('give no file of a revision that is not there', async () => {
    expect(await exportSequence(trimId, 99)).toBeNull();
  });
});

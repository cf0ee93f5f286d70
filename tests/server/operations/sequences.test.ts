import { hash } from '@node-rs/argon2';
import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { postgresErrorOf, sqlStates } from '@/db/errors';
import { findBenchLot } from '@/db/queries/station-lots';
import type { BenchRow } from '@/db/queries/station-benches';
import { insertLot } from '@/db/queries/lots';
import { listLotMoves } from '@/db/queries/lot-moves';
import { findReleased, findRevision, findStandingDraft } from '@/db/queries/sequence-revisions';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { lots } from '@/db/schema/lots';
import { runs } from '@/db/schema/runs';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';
import { signatures } from '@/db/schema/signatures';
import { trail } from '@/db/schema/trail';
import { units } from '@/db/schema/units';
import { cb1210 } from '@/db/seed/board-types';
import { sequences as seeded } from '@/db/seed/sequences';
import type { Actor } from '@/lib/access/actor';
import type { Role } from '@/lib/access/roles';
import type { BenchPlace } from '@/lib/bench/types';
import type { Outcome } from '@/lib/contracts/outcome';
import { checkSequence } from '@/lib/sequence/check-sequence';
import { findingKey } from '@/lib/sequence/finding';
import type { RunPlan } from '@/lib/run/types';
import type { Sequence, Step } from '@/lib/sequence/step';
import { takeLot } from '@/server/operations/bench/take-lot';
import { beginDraft } from '@/server/operations/engineering/sequences/begin-draft';
import { discardDraft } from '@/server/operations/engineering/sequences/discard-draft';
import { renewPresence } from '@/server/operations/engineering/sequences/draft-presence';
import { newSequence } from '@/server/operations/engineering/sequences/new-sequence';
import { readDraftPage } from '@/server/operations/engineering/sequences/read-draft-page';
import { releaseRevision } from '@/server/operations/engineering/sequences/release-revision';
import { saveDraft } from '@/server/operations/engineering/sequences/save-draft';
import { sendBack } from '@/server/operations/engineering/sequences/send-back';
import { submitRevision } from '@/server/operations/engineering/sequences/submit-revision';
import { withdrawRevision } from '@/server/operations/engineering/sequences/withdraw-revision';
import { listBasesForLot } from '@/server/operations/lots/list-lots';
import { moveLot } from '@/server/operations/lots/move-lot';
import { insertAccount, insertStation } from '../../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../../database/temporary-postgres';
import { actorOf } from '../../desk/bases';

const password = 'gauge jaws';
let open: TemporaryDatabase;
let passwordHash: string;
let boardTypeId: string;
let specificationId: string;
let writer: Actor;
let second: Actor;
let third: Actor;
let quality: Actor;

const person = async (name: string, roles: Role[]) =>
  actorOf(await insertAccount(open.db, roles, { name, passwordHash }));

beforeAll(async () => {
  open = await temporaryDatabase();
  passwordHash = await hash(password, { memoryCost: 1024, timeCost: 1 });
  writer = await person('Writer', ['test-engineer', 'quality-manager']);
  second = await person('Second', ['test-engineer']);
  third = await person('Third', ['test-engineer']);
  quality = await person('Quality', ['quality-manager']);
  const [type] = await open.db.insert(boardTypes).values({ code: cb1210.code, name: cb1210.name }).returning();
  boardTypeId = type!.id;
  const [specification] = await open.db
    .insert(boardTypeRevisions)
    .values({
      boardTypeId,
      number: 1,
      specification: cb1210,
      status: 'approved',
      madeBy: writer.accountId,
      approvedBy: quality.accountId,
      approvedAt: new Date(),
    })
    .returning();
  specificationId = specification!.id;
});
afterAll(() => open.close());

let sequenceId: string;
let draftId: string;
let made = 0;
beforeEach(async () => {
  const outcome = await newSequence(writer, { boardTypeCode: cb1210.code, name: `Trim ${++made}` }, whole);
  ({ sequenceId, revisionId: draftId } = valueOf(outcome));
});

const whole = seeded[0]!.sequence;
const withTolerance = (toleranceVolts: number): Sequence => ({
  ...whole,
  steps: whole.steps.map((step): Step => (step.kind === 'trim' ? { ...step, toleranceVolts } : step)),
});

function valueOf<T>(outcome: Outcome<T>): T {
  if (!outcome.ok) throw new Error(`${outcome.code}: ${outcome.sentence}`);
  return outcome.value;
}
const refused = (code: string) => ({ ok: false, code, sentence: expect.stringMatching(/\.$/) });
const rowOf = async (id: string) => (await findRevision(open.db, id))!;
const save = async (who: Actor, sequence: Sequence, id = draftId) =>
  saveDraft(who, { revisionId: id, version: (await rowOf(id)).version, sequence, warningReasons: {} });
const submit = async (id = draftId, who = writer) =>
  submitRevision(who, { revisionId: id, version: (await rowOf(id)).version, note: 'Tighter trim.' });
const release = async (who: Actor, id = draftId, over: { password?: string; version?: number } = {}) =>
  releaseRevision(who, { revisionId: id, version: (await rowOf(id)).version, meaning: 'checked', password, ...over });
const trailOf = (id: string) => open.db.select().from(trail).where(eq(trail.entityId, id)).orderBy(trail.id);

/** Releases the draft that stands, then begins and releases another with a changed trim. */
async function released(): Promise<string> {
  valueOf(await submit());
  valueOf(await release(second));
  return draftId;
}
async function releasedNext(toleranceVolts = 0.018): Promise<string> {
  const { revisionId } = valueOf(await beginDraft(writer, { sequenceId, fromRevisionId: null }));
  valueOf(await save(writer, withTolerance(toleranceVolts), revisionId));
  valueOf(await submit(revisionId));
  valueOf(await release(second, revisionId));
  return revisionId;
}

describe('a new sequence', () => {
  test('begins with a draft of the shortest way to a verdict, in which the rules find no error', async () => {
    const { revisionId } = valueOf(await newSequence(writer, { boardTypeCode: cb1210.code, name: 'From nothing' }));
    const { data, status, number } = await rowOf(revisionId);
    expect({ status, number }).toEqual({ status: 'draft', number: 1 });
    expect(checkSequence(data, cb1210).filter(({ severity }) => severity === 'error')).toEqual([]);
  });

  test('needs a name of its own and a board type that exists', async () => {
    expect(await newSequence(writer, { boardTypeCode: cb1210.code, name: `Trim ${made}` })).toMatchObject({
      ...refused('name-taken'),
      field: 'name',
    });
    expect(await newSequence(writer, { boardTypeCode: 'XX9999', name: 'Other' })).toMatchObject(
      refused('board-type-unknown'),
    );
  });
});

describe('saving a draft', () => {
  test('raises its version and notes who changed it', async () => {
    expect(valueOf(await save(second, withTolerance(0.018)))).toMatchObject({ saved: true, version: 2 });
    expect(await rowOf(draftId)).toMatchObject({ version: 2, savedBy: second.accountId, editedBy: [second.accountId] });
    valueOf(await save(second, withTolerance(0.017)));
    valueOf(await save(writer, withTolerance(0.016)));
    expect((await rowOf(draftId)).editedBy).toEqual([second.accountId, writer.accountId]);
  });

  test('from an older version stores nothing and answers with what stands there and whose it is', async () => {
    valueOf(await save(second, withTolerance(0.018)));
    const late = { revisionId: draftId, version: 1, sequence: withTolerance(0.03), warningReasons: {} };
    expect(valueOf(await saveDraft(writer, late))).toMatchObject({
      saved: false,
      version: 2,
      savedBy: 'Second',
      sequence: withTolerance(0.018),
    });
    expect((await rowOf(draftId)).data).toEqual(withTolerance(0.018));
  });

  test('at the same moment by two people stores one of them', async () => {
    const both = await Promise.all(
      [writer, second].map((who, i) =>
        saveDraft(who, {
          revisionId: draftId,
          version: 1,
          sequence: withTolerance(0.018 - i / 1000),
          warningReasons: {},
        }),
      ),
    );
    expect(both.map((each) => valueOf(each).saved).sort()).toEqual([false, true]);
  });

  test('is refused once it is submitted', async () => {
    valueOf(await submit());
    expect(await save(writer, withTolerance(0.018))).toMatchObject(refused('not-a-draft'));
  });
});

describe('who has a draft open', () => {
  test('is told to the others, without oneself, with the step they are at', async () => {
    const tab = (who: Actor, tabId: string, stepId: string | null) =>
      renewPresence(who, { revisionId: draftId, tabId, stepId });
    expect(valueOf(await tab(writer, 'a', null))).toMatchObject({ others: [], version: 1, status: 'draft' });
    expect(valueOf(await tab(second, 'b', 's5')).others).toEqual([{ name: 'Writer', stepId: null }]);
    valueOf(await tab(writer, 'c', null));
    expect(valueOf(await tab(writer, 'a', null)).others).toEqual([{ name: 'Second', stepId: 's5' }]);
    expect(await renewPresence(writer, { revisionId: sequenceId, tabId: 'a', stepId: null })).toMatchObject(
      refused('revision-unknown'),
    );
  });
});

describe('submitting', () => {
  test('keeps what changed and why in the trail, with the steps', async () => {
    await released();
    const { revisionId } = valueOf(await beginDraft(writer, { sequenceId, fromRevisionId: null }));
    valueOf(await save(writer, withTolerance(0.018), revisionId));
    valueOf(await submit(revisionId));
    expect((await trailOf(revisionId)).at(-1)).toMatchObject({
      action: 'sequence.submitted',
      reason: 'Tighter trim.',
      after: { revision: 'r2', changes: ['Step 5, Trim: tolerance 20 mV is now 18 mV.'] },
    });
  });

  test('is refused while an error stands, checked by the server', async () => {
    valueOf(await save(writer, { ...whole, steps: whole.steps.slice(0, -1) }));
    expect(await submit()).toMatchObject(refused('sequence-has-errors'));
  });

  test('needs a reason for every warning, which is kept; reasons of warnings that are gone are not', async () => {
    const quick: Sequence = {
      ...whole,
      steps: whole.steps.map((step): Step => (step.kind === 'find-points' ? { ...step, settleMs: 30 } : step)),
    };
    const [warning] = checkSequence(quick, cb1210);
    const saved = (version: number, warningReasons: Record<string, string>) =>
      saveDraft(writer, { revisionId: draftId, version, sequence: quick, warningReasons });
    valueOf(await saved(1, {}));
    expect(await submit()).toMatchObject(refused('warning-needs-reason'));
    valueOf(await saved(2, { [findingKey(warning!)]: 'Measured on S1.', 'gone:s1:': 'Old.' }));
    valueOf(await submit());
    expect((await rowOf(draftId)).warningReasons).toEqual({ [findingKey(warning!)]: 'Measured on S1.' });
  });

  test('is refused for a version that was saved over, and when nothing differs from the revision in use', async () => {
    const stale = { revisionId: draftId, version: 1, note: 'Tighter trim.' };
    valueOf(await save(third, withTolerance(0.018)));
    expect(await submitRevision(writer, stale)).toMatchObject(refused('draft-changed'));
    await released();
    const { revisionId } = valueOf(await beginDraft(writer, { sequenceId, fromRevisionId: null }));
    expect(await submit(revisionId)).toMatchObject(refused('nothing-changed'));
  });

  test('can be sent back with a reason that the writer sees until the next time', async () => {
    valueOf(await submit());
    valueOf(await sendBack(quality, { revisionId: draftId, reason: 'Say why.' }));
    expect((await readDraftPage(writer, sequenceId))!.head).toMatchObject({
      status: 'draft',
      sentBackBy: 'Quality',
      sentBackReason: 'Say why.',
    });
    expect(await sendBack(quality, { revisionId: draftId, reason: 'Once more.' })).toMatchObject(
      refused('not-submitted'),
    );
    valueOf(await submit());
    expect((await rowOf(draftId)).sentBackReason).toBeNull();
  });
});

describe('releasing', () => {
  test('signs with name, time and meaning, and supersedes the one in use in the same step', async () => {
    const first = await released();
    const next = await releasedNext();
    expect(await rowOf(first)).toMatchObject({ status: 'superseded', supersededAt: expect.any(Date) });
    expect(await rowOf(next)).toMatchObject({
      status: 'released',
      releasedBy: second.accountId,
      releaseMeaning: 'I compared it with the revision in use and checked every change.',
    });
    const signed = await open.db.select().from(signatures).where(eq(signatures.subjectId, next));
    expect(signed).toMatchObject([{ name: 'Second', content: { revision: 'r2', sequence: withTolerance(0.018) } }]);
    expect((await trailOf(next)).at(-1)).toMatchObject({ action: 'sequence.released', before: { revision: 'r1' } });
    expect((await findReleased(open.db, sequenceId))!.id).toBe(next);
  });

  test('is refused to whoever made, changed or submitted it, whatever roles they hold', async () => {
    valueOf(await save(second, withTolerance(0.018)));
    valueOf(await submit(draftId, third));
    for (const who of [writer, second, third])
      expect(await release(who), who.name).toMatchObject(refused('not-yours-to-release'));
    expect((await readDraftPage(second, sequenceId))!.mayRelease).toBe(false);
    expect((await readDraftPage(quality, sequenceId))!.mayRelease).toBe(true);
    valueOf(await release(quality));
  });

  test('needs the password, which is counted, and the version that was seen', async () => {
    valueOf(await submit());
    expect(await release(second, draftId, { password: 'no' })).toMatchObject(refused('wrong-password'));
    expect(await release(quality, draftId, { version: 7 })).toMatchObject(refused('draft-changed'));
    expect((await rowOf(draftId)).status).toBe('submitted');
  });

  test('is refused of a draft, and of one released already', async () => {
    expect(await release(quality)).toMatchObject(refused('not-submitted'));
    valueOf(await submit());
    const both = await Promise.all([release(third), release(quality)]);
    expect(both.map(({ ok }) => ok).sort()).toEqual([false, true]);
  });
});

describe('what is released', () => {
  const change = async (id: string, values: Partial<typeof sequenceRevisions.$inferInsert>) => {
    try {
      await open.db.update(sequenceRevisions).set(values).where(eq(sequenceRevisions.id, id));
      return 'changed';
    } catch (error) {
      return postgresErrorOf(error)?.code;
    }
  };

  test('is not changed by any program while in use, superseded or withdrawn', async () => {
    const first = await released();
    await releasedNext();
    for (const values of [{ data: withTolerance(0.5) }, { note: 'x' }, { status: 'draft' as const }])
      expect(await change(first, values), JSON.stringify(Object.keys(values))).toBe(sqlStates.protectedRecord);
    expect(await change(first, { status: 'released' })).toBe(sqlStates.protectedRecord);
    valueOf(await withdrawRevision(quality, { revisionId: first, reason: 'Wrong window.', password }));
    expect(await change(first, { withdrawnReason: 'another' })).toBe(sqlStates.protectedRecord);
    await expect(open.db.delete(sequenceRevisions).where(eq(sequenceRevisions.id, first))).rejects.toThrow();
  });

  test('is withdrawn with a signed reason; then no lot is made from it', async () => {
    const id = await released();
    const basis = async () => (await listBasesForLot()).some(({ sequenceRevisionId }) => sequenceRevisionId === id);
    expect(await basis()).toBe(true);
    expect(await withdrawRevision(third, { revisionId: id, reason: 'Wrong window.', password: 'no' })).toMatchObject(
      refused('wrong-password'),
    );
    valueOf(await withdrawRevision(quality, { revisionId: id, reason: 'Wrong window.', password }));
    expect(await rowOf(id)).toMatchObject({ status: 'withdrawn', withdrawnReason: 'Wrong window.' });
    expect(await basis()).toBe(false);
    expect(await withdrawRevision(quality, { revisionId: id, reason: 'Once more.', password })).toMatchObject(
      refused('not-released'),
    );
  });
});

describe('drafts', () => {
  test('are begun from the revision in use, or restore an older one, one at a time', async () => {
    const first = await released();
    const next = await releasedNext();
    const draft = valueOf(await beginDraft(third, { sequenceId, fromRevisionId: first }));
    expect(await rowOf(draft.revisionId)).toMatchObject({ number: 3, basedOnId: first, madeBy: third.accountId });
    expect((await rowOf(draft.revisionId)).data).toEqual((await rowOf(first)).data);
    expect((await trailOf(draft.revisionId))[0]).toMatchObject({ action: 'sequence.draft-restored' });
    expect(await beginDraft(writer, { sequenceId, fromRevisionId: next })).toMatchObject(refused('draft-exists'));
  });

  test('begun at the same moment are one', async () => {
    await released();
    const both = await Promise.all([writer, third].map((who) => beginDraft(who, { sequenceId, fromRevisionId: null })));
    expect(both.map(({ ok }) => ok).sort()).toEqual([false, true]);
  });

  test('that are discarded stay in the history with their steps, and keep their number', async () => {
    await released();
    const { revisionId } = valueOf(await beginDraft(writer, { sequenceId, fromRevisionId: null }));
    valueOf(await save(writer, withTolerance(0.018), revisionId));
    valueOf(await discardDraft(second, { revisionId, reason: 'Not needed.' }));
    expect(await findStandingDraft(open.db, sequenceId)).toBeNull();
    expect(await rowOf(revisionId)).toMatchObject({ status: 'withdrawn', releasedBy: null, number: 2 });
    expect(valueOf(await beginDraft(writer, { sequenceId, fromRevisionId: revisionId })).number).toBe(3);
  });

  test('that wait for release, or are released, are not discarded', async () => {
    valueOf(await submit());
    expect(await discardDraft(writer, { revisionId: draftId, reason: 'Not needed.' })).toMatchObject(
      refused('not-a-draft'),
    );
    valueOf(await release(second));
    expect(await discardDraft(writer, { revisionId: draftId, reason: 'Not needed.' })).toMatchObject(
      refused('not-a-draft'),
    );
  });
});

describe('a lot', () => {
  let lot: typeof lots.$inferSelect;
  let first: string;
  let next: string;
  beforeEach(async () => {
    first = await released();
    const values = {
      code: `L-${made}`,
      boardTypeRevisionId: specificationId,
      sequenceRevisionId: first,
      size: 1,
      createdBy: quality.accountId,
    };
    lot = await open.db.transaction((tx) => insertLot(tx, values, [`CB12102648${String(made).padStart(5, '0')}`]));
    next = await releasedNext();
  });
  const pinned = async () => (await open.db.select().from(lots).where(eq(lots.id, lot.id)))[0]!.sequenceRevisionId;
  const move = (toRevisionId = next) => moveLot(quality, { lotId: lot.id, toRevisionId, reason: 'Customer asks.' });

  test('keeps its revision when a newer one is released, and new lots take the newer one', async () => {
    expect(await pinned()).toBe(first);
    const bases = (await listBasesForLot()).map(({ sequenceRevisionId }) => sequenceRevisionId);
    expect(bases).toContain(next);
    expect(bases).not.toContain(first);
  });

  test('is moved to the newer one as a recorded decision', async () => {
    valueOf(await move());
    expect(await pinned()).toBe(next);
    expect(await listLotMoves(open.db, lot.id)).toMatchObject([
      { fromNumber: 1, toNumber: 2, reason: 'Customer asks.', movedByName: 'Quality' },
    ]);
    expect((await trailOf(lot.id)).at(-1)).toMatchObject({ action: 'lot.moved', reason: 'Customer asks.' });
    expect(await move()).toMatchObject(refused('revision-not-newer'));
    expect(await move(first)).toMatchObject(refused('revision-not-newer'));
  });

  test('whose revision is withdrawn is refused at the bench with the reason, until it is moved', async () => {
    const take = () =>
      takeLot(open.db, {} as BenchRow, { kind: 'lot', by: { lotId: lot.id } }, { offerId: null } as BenchPlace);
    valueOf(await withdrawRevision(quality, { revisionId: first, reason: 'Wrong window.', password }));
    expect(await take()).toEqual({
      ok: false,
      refusal: { code: 'sequence-withdrawn', params: { revision: 'r1', reason: 'Wrong window.' } },
    });
    valueOf(await move());
    expect(await findBenchLot(open.db, { lotId: lot.id })).toMatchObject({ sequenceStatus: 'released' });
  });

  test('is not moved while a board is in test, when closed, nor to what is not in use or of another sequence', async () => {
    const station = await insertStation(open.db);
    const [unit] = await open.db.select().from(units).where(eq(units.lotId, lot.id));
    const [run] = await open.db
      .insert(runs)
      .values({
        kind: 'production',
        unitId: unit!.id,
        lotId: lot.id,
        stationId: station.id,
        operatorId: quality.accountId,
        attempt: 1,
        plan: {} as RunPlan,
      })
      .returning();
    expect(await move()).toMatchObject(refused('lot-in-test'));
    await open.db.delete(runs).where(eq(runs.id, run!.id));
    const { revisionId } = valueOf(await beginDraft(writer, { sequenceId, fromRevisionId: null }));
    expect(await move(revisionId)).toMatchObject(refused('revision-not-released'));
    const other = valueOf(await newSequence(writer, { boardTypeCode: cb1210.code, name: `Other ${made}` }));
    expect(await move(other.revisionId)).toMatchObject(refused('revision-unknown'));
    await open.db.update(lots).set({ state: 'closed', closedAt: new Date() }).where(eq(lots.id, lot.id));
    expect(await move()).toMatchObject(refused('lot-closed'));
    const ofSequence = and(eq(sequences.id, sequenceId), eq(sequences.boardTypeId, boardTypeId));
    expect(await open.db.$count(sequences, ofSequence)).toBe(1);
  });
});

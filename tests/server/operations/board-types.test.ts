import { desc, eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { listLotBases } from '@/db/queries/lots';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { lots } from '@/db/schema/lots';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences as sequenceTable } from '@/db/schema/sequences';
import { trail } from '@/db/schema/trail';
import { cb1210 } from '@/db/seed/board-types';
import { sequences } from '@/db/seed/sequences';
import type { Actor } from '@/lib/access/actor';
import type { BoardType } from '@/lib/contracts/board-type';
import { hashSecret } from '@/server/auth/secret-hash';
import { approveLimits } from '@/server/operations/engineering/board-types/approve';
import { askApproval } from '@/server/operations/engineering/board-types/ask-approval';
import { beginBoardTypeDraft } from '@/server/operations/engineering/board-types/begin-draft';
import { discardBoardTypeDraft } from '@/server/operations/engineering/board-types/discard-draft';
import { listBoardTypeRows } from '@/server/operations/engineering/board-types/list-board-types';
import { newBoardType } from '@/server/operations/engineering/board-types/new-board-type';
import { readBoardType } from '@/server/operations/engineering/board-types/read-board-type';
import { saveBoardTypeDraft } from '@/server/operations/engineering/board-types/save-draft';
import { sendBackLimits, takeBack } from '@/server/operations/engineering/board-types/send-back';
import { insertAccount } from '../../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../../database/temporary-postgres';
import { actorOf } from '../../desk/bases';

let open: TemporaryDatabase;
let engineer: Actor;
let other: Actor;
let quality: Actor;
/** Holds both roles: may edit and approve, but never both of one revision. */
let both: Actor;
let typeId: string;
let firstId: string;
const password = 'a long enough password';
const note = 'Load tests showed trips at 10.72 V';

beforeAll(async () => {
  open = await temporaryDatabase();
  const passwordHash = await hashSecret(password);
  const made = async (roles: Actor['roles']) => actorOf(await insertAccount(open.db, [...roles], { passwordHash }));
  engineer = await made(['test-engineer']);
  other = await made(['test-engineer']);
  quality = await made(['quality-manager']);
  both = await made(['test-engineer', 'quality-manager']);
  const [type] = await open.db.insert(boardTypes).values({ code: 'CB1210', name: cb1210.name }).returning();
  typeId = type!.id;
  const [first] = await open.db
    .insert(boardTypeRevisions)
    .values({
      boardTypeId: typeId,
      number: 1,
      specification: cb1210,
      status: 'approved',
      madeBy: engineer.accountId,
      approvedBy: quality.accountId,
      approvedAt: new Date(),
    })
    .returning();
  firstId = first!.id;
  const [sequence] = await open.db
    .insert(sequenceTable)
    .values({ boardTypeId: typeId, name: 'End of line' })
    .returning();
  await open.db.insert(sequenceRevisions).values({
    sequenceId: sequence!.id,
    number: 6,
    data: sequences.find(({ boardTypeCode }) => boardTypeCode === 'CB1210')!.sequence,
    status: 'released',
    madeBy: engineer.accountId,
    releasedBy: other.accountId,
    releasedAt: new Date(),
  });
});
afterAll(() => open.close());

const narrower = (over: Partial<BoardType['limits']> = {}): BoardType => ({
  ...cb1210,
  limits: { ...cb1210.limits, tripVolts: { min: 10.72, max: 10.88 }, ...over },
});
const rowOf = async (id: string) =>
  (await open.db.select().from(boardTypeRevisions).where(eq(boardTypeRevisions.id, id)))[0]!;
const newestTrail = async (entityId: string) =>
  (await open.db.select().from(trail).where(eq(trail.entityId, entityId)).orderBy(desc(trail.id)).limit(1))[0]!;

/** A draft of CB1210 with narrower trip limits, saved once: version 2. */
async function savedDraft(actor = engineer, specification = narrower()): Promise<string> {
  const begun = await beginBoardTypeDraft(actor, { code: 'CB1210' });
  if (!begun.ok) throw new Error(begun.sentence);
  const saved = await saveBoardTypeDraft(actor, { revisionId: begun.value.revisionId, version: 1, specification });
  expect(saved).toMatchObject({ ok: true, value: { version: 2 } });
  return begun.value.revisionId;
}
const asked = async (revisionId: string, actor = engineer) =>
  expect(await askApproval(actor, { revisionId, version: 2, note })).toMatchObject({ ok: true });
const sign = (actor: Actor, revisionId: string, over: Partial<Parameters<typeof approveLimits>[1]> = {}) =>
  approveLimits(actor, { revisionId, version: 2, meaning: 'specification', password, ...over });

beforeEach(async () => {
  await open.db.delete(boardTypeRevisions).where(eq(boardTypeRevisions.status, 'draft'));
  await open.db.delete(boardTypeRevisions).where(eq(boardTypeRevisions.status, 'submitted'));
});

describe('a draft', () => {
  test('begins from what is in use, one at a time', async () => {
    const begun = await beginBoardTypeDraft(engineer, { code: 'CB1210' });
    expect(begun.ok && (await rowOf(begun.value.revisionId)).specification).toEqual(cb1210);
    expect(await beginBoardTypeDraft(other, { code: 'CB1210' })).toMatchObject({ code: 'draft-exists' });
    expect(await beginBoardTypeDraft(other, { code: 'NONE' })).toMatchObject({ code: 'board-type-unknown' });
  });

  test('a save from an older version is refused and changes nothing', async () => {
    const revisionId = await savedDraft();
    const late = await saveBoardTypeDraft(other, { revisionId, version: 1, specification: cb1210 });
    expect(late).toMatchObject({ code: 'draft-changed' });
    expect((await rowOf(revisionId)).specification).toEqual(narrower());
  });

  test('keeps its code, and refers only to files that are stored for it', async () => {
    const revisionId = await savedDraft();
    const save = (specification: BoardType) => saveBoardTypeDraft(engineer, { revisionId, version: 2, specification });
    expect(await save({ ...cb1210, code: 'CB9999' })).toMatchObject({ code: 'code-fixed' });
    const fileId = '00000000-0000-4000-8000-000000000000';
    expect(await save({ ...cb1210, fixtureDrawing: { fileId } })).toMatchObject({ code: 'file-unknown' });
  });

  test('discarded, it stays in the history under its number and the next takes another', async () => {
    const revisionId = await savedDraft();
    const { number } = await rowOf(revisionId);
    await discardBoardTypeDraft(engineer, { revisionId, reason: 'Not needed now' });
    expect(await rowOf(revisionId)).toMatchObject({ status: 'withdrawn' });
    expect(await newestTrail(revisionId)).toMatchObject({
      action: 'board-type.draft-discarded',
      reason: 'Not needed now',
    });
    const next = await beginBoardTypeDraft(engineer, { code: 'CB1210' });
    expect(next.ok && next.value.number).toBeGreaterThan(number);
  });

  test('of a new board type is a copy with its own code, serials and no pictures', async () => {
    expect(await newBoardType(engineer, { code: 'CB1205', name: '12 V 5 A', copyOfCode: 'CB1210' })).toMatchObject({
      ok: true,
    });
    const page = await readBoardType(engineer, 'CB1205');
    expect(page).toMatchObject({ inUse: null, shown: { status: 'draft', number: 1 } });
    expect(page!.shown.specification).toMatchObject({ code: 'CB1205', serialPattern: '^CB1205\\d{4}\\d{5}$' });
    expect(await newBoardType(engineer, { code: 'CB1205', name: '12 V 5 A', copyOfCode: 'CB1210' })).toMatchObject({
      code: 'board-type-exists',
      field: 'code',
    });
  });
});

describe('asking for approval', () => {
  test('is refused with errors, without a change, and for a draft saved meanwhile', async () => {
    const wrong = await savedDraft(engineer, narrower({ releaseVolts: { min: 10.8, max: 12.5 } }));
    expect(await askApproval(engineer, { revisionId: wrong, version: 2, note })).toMatchObject({ code: 'has-errors' });
    expect(await askApproval(engineer, { revisionId: wrong, version: 1, note })).toMatchObject({
      code: 'draft-changed',
    });
    await discardBoardTypeDraft(engineer, { revisionId: wrong, reason: 'was wrong' });
    const same = await savedDraft(engineer, { ...cb1210 });
    expect(await askApproval(engineer, { revisionId: same, version: 2, note })).toMatchObject({
      code: 'nothing-changed',
    });
  });

  test('keeps why, and nothing can be saved while it waits', async () => {
    const revisionId = await savedDraft();
    await asked(revisionId);
    expect(await rowOf(revisionId)).toMatchObject({ status: 'submitted', note, submittedBy: engineer.accountId });
    expect(await saveBoardTypeDraft(engineer, { revisionId, version: 2, specification: cb1210 })).toMatchObject({
      code: 'not-a-draft',
    });
  });

  test('names the sequences in use that no longer fit', async () => {
    await savedDraft(engineer, narrower({ tripVolts: { min: 10.82, max: 10.9 } }));
    const page = await readBoardType(quality, 'CB1210');
    expect(page!.misfits).toHaveLength(1);
    expect(page!.misfits[0]).toMatchObject({ name: 'End of line', revision: 'r6' });
  });
});

describe('approval', () => {
  test('nobody approves what they made, changed or asked for', async () => {
    const made = await savedDraft(both);
    await asked(made, engineer);
    expect(await sign(both, made)).toMatchObject({ code: 'own-change' });
    expect((await readBoardType(both, 'CB1210'))!.mayApprove).toBe(false);
    expect((await readBoardType(quality, 'CB1210'))!.mayApprove).toBe(true);
    expect(await sign(other, made)).toMatchObject({ code: 'own-change' });
  });

  test('a wrong password signs nothing, and what was not seen is not signed', async () => {
    const revisionId = await savedDraft();
    await asked(revisionId);
    expect(await sign(quality, revisionId, { password: 'guess' })).toMatchObject({
      code: 'wrong-password',
      field: 'password',
    });
    expect(await sign(quality, revisionId, { version: 1 })).toMatchObject({ code: 'draft-changed' });
    expect(await rowOf(revisionId)).toMatchObject({ status: 'submitted', approvedBy: null });
  });

  test('sent back, it is a draft with the reason; taken back, it is a draft again', async () => {
    const revisionId = await savedDraft();
    await asked(revisionId);
    await sendBackLimits(quality, { revisionId, version: 2, reason: 'The drawing says 10.75 V' });
    expect(await rowOf(revisionId)).toMatchObject({ status: 'draft', sentBackReason: 'The drawing says 10.75 V' });
    await asked(revisionId);
    expect(await rowOf(revisionId)).toMatchObject({ status: 'submitted', sentBackReason: null });
    expect(await takeBack(engineer, { revisionId })).toMatchObject({ ok: true });
    expect(await rowOf(revisionId)).toMatchObject({ status: 'draft' });
    expect(await sign(quality, revisionId)).toMatchObject({ code: 'not-waiting' });
  });

  test('signed, new lots take it, open lots keep theirs, and the old limits stay with who, when and why', async () => {
    const { sequenceRevisionId } = (await listLotBases(open.db)).find((basis) => basis.boardTypeCode === 'CB1210')!;
    const [lot] = await open.db
      .insert(lots)
      .values({
        code: 'L-1',
        boardTypeRevisionId: firstId,
        sequenceRevisionId,
        size: 1,
        serialDigits: 5,
        createdBy: quality.accountId,
      } as typeof lots.$inferInsert)
      .returning();
    const revisionId = await savedDraft();
    await asked(revisionId);
    expect(await sign(quality, revisionId)).toMatchObject({ ok: true });
    expect(await rowOf(revisionId)).toMatchObject({ status: 'approved', approvedBy: quality.accountId });
    expect(await rowOf(firstId)).toMatchObject({ status: 'superseded', specification: cb1210 });
    const basis = (await listLotBases(open.db)).find(({ boardTypeCode }) => boardTypeCode === 'CB1210')!;
    expect(basis.boardTypeRevisionId).toBe(revisionId);
    const [kept] = await open.db.select().from(lots).where(eq(lots.id, lot!.id));
    expect(kept!.boardTypeRevisionId).toBe(firstId);
    expect(await newestTrail(revisionId)).toMatchObject({
      action: 'board-type.approved',
      reason: note,
      before: { number: 1, limits: { tripVolts: { min: 10.7, max: 10.9 } } },
    });
    const page = await readBoardType(quality, 'CB1210');
    expect(page!.openLots).toEqual([{ code: 'L-1', revisionNumber: 1 }]);
    expect(page!.history.filter(({ status }) => status === 'superseded')).toHaveLength(1);
    expect((await listBoardTypeRows()).find(({ code }) => code === 'CB1210')).toMatchObject({
      inUse: page!.shown.number,
      draft: null,
      lots: { all: 1, open: 1 },
    });
  });

  test('an approved revision is not rewritten, whichever program tries', async () => {
    const [approved] = await open.db.select().from(boardTypeRevisions).where(eq(boardTypeRevisions.status, 'approved'));
    await expect(
      open.db.update(boardTypeRevisions).set({ specification: cb1210 }).where(eq(boardTypeRevisions.id, approved!.id)),
    ).rejects.toMatchObject({ cause: { code: 'SW002' } });
  });
});

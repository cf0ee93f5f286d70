import { asc, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getLotBoardType } from '@/db/queries/chart-baselines';
import { findRuleSet } from '@/db/queries/lot-holds';
import { accounts } from '@/db/schema/accounts';
import type { stations } from '@/db/schema/stations';
import { trail } from '@/db/schema/trail';
import { units } from '@/db/schema/units';
import type { Actor } from '@/lib/access/actor';
import { usualRuleSet } from '@/lib/quality/hold-cause';
import { hashSecret } from '@/server/auth/secret-hash';
import { raiseHold } from '@/server/operations/holds/raise-hold';
import { readHoldRules } from '@/server/operations/holds/read-hold-rules';
import { readLotHolds } from '@/server/operations/holds/read-lot-holds';
import { setHoldRules } from '@/server/operations/holds/set-hold-rules';
import { createLot } from '@/server/operations/lots/create-lot';
import { releaseLot } from '@/server/operations/lots/hold-lot';
import { readLotPage } from '@/server/operations/lots/read-lot-page';
import { insertAccount, insertStation } from '../database/records';
import { temporaryDatabase, type TemporaryDatabase } from '../database/temporary-postgres';
import { actorOf, insertReleasedSequence } from './bases';
import { insertRun } from './runs';

const password = 'a password of quality';
const code = '2648-H';
let open: TemporaryDatabase;
let actor: Actor;
let lotId: string;
let places: (typeof stations.$inferSelect)[];

beforeAll(async () => {
  open = await temporaryDatabase();
  const account = await insertAccount(open.db, ['quality-manager']);
  const passwordHash = await hashSecret(password);
  await open.db.update(accounts).set({ passwordHash }).where(eq(accounts.id, account.id));
  actor = actorOf(account);
  places = [await insertStation(open.db), await insertStation(open.db)];
  const basis = await insertReleasedSequence(open.db);
  await createLot(actor, {
    code,
    sequenceRevisionId: basis.sequenceRevision.id,
    serials: { kind: 'counted', firstSerial: 'CB1210264800001', quantity: 8 },
  });
  lotId = (await readLotPage(code))!.id;
  const boards = await open.db.select().from(units).where(eq(units.lotId, lotId)).orderBy(asc(units.position));
  // Odd boards at the first station, even ones at the second; the fourth is rejected.
  for (const [i, unit] of boards.entries())
    await insertRun(open.db, {
      unit,
      stationId: places[i % 2]!.id,
      operatorId: actor.accountId,
      attempt: 1,
      minute: i,
      ending: i === 3 ? { verdict: 'reject', reason: 'release-too-high' } : { verdict: 'pass' },
    });
});
afterAll(() => open.close());

describe('rules that hold lots', () => {
  it('are the usual ones until somebody sets others, which count with their reason from then on', async () => {
    const before = (await readHoldRules('CB1210'))!;
    expect(before).toMatchObject({ rules: usualRuleSet, history: [] });
    const rules = { ...usualRuleSet, yieldFloor: { least: 0.9, boards: 50 }, sameReason: null };
    const set = await setHoldRules(actor, { code: 'CB1210', rules, reason: 'Too many lots held for nothing' });
    expect(set).toMatchObject({ ok: true });
    const after = (await readHoldRules('CB1210'))!;
    expect(after).toMatchObject({ rules, history: [{ setBy: actor.name, reason: 'Too many lots held for nothing' }] });
    const { boardTypeId } = await getLotBoardType(open.db, lotId);
    expect((await findRuleSet(open.db, boardTypeId))!.rules).toEqual(rules);
    const [entry] = await open.db.select().from(trail).where(eq(trail.action, 'board-type.hold-rules-set'));
    expect(entry).toMatchObject({ before: usualRuleSet, after: { code: 'CB1210', ...rules } });
  });

  it('are not stored again unchanged', async () => {
    const { rules } = (await readHoldRules('CB1210'))!;
    const again = await setHoldRules(actor, { code: 'CB1210', rules, reason: 'x' });
    expect(again).toMatchObject({ ok: false, code: 'nothing-changed' });
  });
});

describe('a hold', () => {
  const run = (fromBoard: number, stationCode: string | null) => ({
    cause: 'run-rule' as const,
    holdRule: { rule: 2 as const, times: 1, within: 1 },
    fromBoard,
    toBoard: 8,
    stationCode,
  });
  const raise = (detail: Parameters<typeof raiseHold>[2]) =>
    open.db.transaction((tx) => raiseHold(tx, lotId, detail, { runId: null, stationId: null }));
  const release = (reason: string) => releaseLot(actor, { lotId, reason, password });
  const suspectSerials = async () =>
    (await readLotHolds(code))!.suspects!.boards.map(({ serial }) => Number(serial.slice(-5)));

  it('by a run makes suspect what passed since the run began, the first board of it too', async () => {
    await raise(run(3, null));
    expect(await suspectSerials()).toEqual([3, 5, 6, 7, 8]);
    expect((await readLotPage(code))!.hold!.suspects).toEqual({ boards: 5, since: 'run' });
    await release('Cause found');
  });

  it('by a run at one station leaves the boards of the others alone', async () => {
    await raise(run(3, places[0]!.code));
    expect(await suspectSerials()).toEqual([3, 5, 7]);
    await release('Fixture cleaned');
  });

  it('otherwise makes suspect what passed since the last good check, everything where none is on record', async () => {
    await raise({ cause: 'same-reason', reason: 'release-too-high', times: 3, stationCode: places[1]!.code });
    const page = (await readLotHolds(code))!;
    expect(page.suspects).toMatchObject({
      since: 'good-check',
      stations: [{ code: places[1]!.code, fromIso: null }],
    });
    expect(await suspectSerials()).toEqual([2, 6, 8]);
    await release('Reel taken off');
  });

  it('stays in the history with its cause, its release and the signature under it', async () => {
    const { suspects, holds } = (await readLotHolds(code))!;
    expect(suspects).toBeNull();
    expect(holds.map(({ cause, release: end }) => [cause, end?.reason])).toEqual([
      ['same-reason', 'Reel taken off'],
      ['run-rule', 'Fixture cleaned'],
      ['run-rule', 'Cause found'],
    ]);
    expect(holds[0]!.release!.signature).toMatchObject({ name: actor.name, holds: true });
  });
});

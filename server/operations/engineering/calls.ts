import { acknowledgeOpenCall, listOpenCalls } from '@/db/queries/engineering-calls';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { EngineerCall } from '@/lib/contracts/engineer-call';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

export async function readOpenCalls(): Promise<EngineerCall[]> {
  const calls = await listOpenCalls(database());
  return calls.map(({ at, ...call }) => ({ ...call, sinceIso: at.toISOString() }));
}

/** "I am coming": ends the call at every desk and tells the bench who comes. Code: call-over. */
export async function acknowledgeCall(actor: Actor, callId: string, at = new Date()): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const call = await acknowledgeOpenCall(tx, callId, { accountId: actor.accountId, at });
    if (!call) return refusal('call-over', 'Someone else is on the way already.');
    await insertTrail(tx, actor, {
      action: 'call.acknowledged',
      entity: 'station',
      entityId: call.stationId,
      after: { waitedSeconds: Math.round((at.getTime() - call.calledAt.getTime()) / 1_000) },
    });
    return done;
  });
}

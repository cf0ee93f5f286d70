'use client';

import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { DryRunSettings, DryRunView } from '@/lib/contracts/dry-run';
import type { Outcome } from '@/lib/contracts/outcome';
import { fetchJson } from '../fetch-json';

export interface DryRunActions {
  ask(input: { revisionId: string; settings: DryRunSettings }): Promise<Outcome<DryRunView>>;
  cancel(input: { id: string }): Promise<Outcome>;
  keep(input: { id: string; kept: boolean }): Promise<Outcome>;
}

export interface DryRunHandle {
  /** The newest dry run of the draft; null: none yet. */
  view: DryRunView | null;
  /** Waiting or running: the fields of the draft are locked meanwhile. */
  isAtWork: boolean;
  /** What went wrong with the last thing asked for; null: nothing. */
  problem: string | null;
  /** Whether something asked for has not been answered yet. */
  asking: boolean;
  start(settings: DryRunSettings): Promise<void>;
  stop(): Promise<void>;
  keep(kept: boolean): Promise<void>;
}

export const isAtWork = (view: DryRunView | null) => view?.state === 'waiting' || view?.state === 'running';

const whileAtWorkMs = 500;
const unreachable = 'The server did not answer. The dry run was not changed. Try again.';

/** A draft's newest dry run, read again twice a second while it is at work. The editor holds it and gives it to the pane. */
export function useDryRun(job: {
  revisionId: string;
  initial: DryRunView | null;
  actions: DryRunActions;
}): DryRunHandle {
  const { revisionId, initial, actions } = job;
  const client = useQueryClient();
  const [id, setId] = useState(initial?.id ?? null);
  const [problem, setProblem] = useState<string | null>(null);
  const [asking, setAsking] = useState(false);
  const query = useQuery({
    queryKey: ['dry-run', id],
    queryFn: ({ signal }) => fetchJson<DryRunView>(`/api/dry-runs/${id}`, signal),
    enabled: id !== null,
    ...(initial !== null && initial.id === id && { initialData: initial }),
    refetchInterval: ({ state }) => (isAtWork(state.data ?? null) ? whileAtWorkMs : false),
  });
  const view = id === null ? null : (query.data ?? null);

  async function send<T>(work: Promise<Outcome<T>>): Promise<T | null> {
    setAsking(true);
    setProblem(null);
    try {
      const outcome = await work;
      if (outcome.ok) return outcome.value;
      setProblem(outcome.sentence);
    } catch (error) {
      // A redirect to the sign-in page is Next's own error and must go on.
      if (String((error as { digest?: unknown }).digest ?? '').startsWith('NEXT_')) throw error;
      setProblem(unreachable);
    } finally {
      setAsking(false);
    }
    return null;
  }

  return {
    view,
    isAtWork: isAtWork(view),
    problem,
    asking,
    async start(settings) {
      const asked = await send(actions.ask({ revisionId, settings }));
      if (!asked) return;
      client.setQueryData(['dry-run', asked.id], asked);
      setId(asked.id);
    },
    async stop() {
      if (id === null) return;
      await send(actions.cancel({ id }));
      await query.refetch();
    },
    async keep(kept) {
      if (id === null) return;
      await send(actions.keep({ id, kept }));
      await query.refetch();
    },
  };
}

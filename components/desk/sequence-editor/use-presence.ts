'use client';

import { useQuery } from '@tanstack/react-query';
import type { Outcome } from '@/lib/contracts/outcome';
import type { OtherEditor } from '@/lib/contracts/sequence-draft';
import type { SequenceRevisionState } from '@/lib/contracts/stored-states';

interface Presence {
  others: OtherEditor[];
  version: number;
  status: SequenceRevisionState;
}

const everyMs = 3_000;

/** Tells every 3 s that this tab has the draft open, at which step, and hears who else has and what version is saved. */
export function usePresence(job: {
  revisionId: string;
  tabId: string | null;
  stepId: string | null;
  enabled: boolean;
}) {
  const { revisionId, tabId, stepId, enabled } = job;
  const query = useQuery({
    queryKey: ['draft-presence', revisionId, tabId],
    enabled: enabled && tabId !== null,
    refetchInterval: everyMs,
    queryFn: async ({ signal }) => {
      const response = await fetch(`/api/drafts/${revisionId}/presence`, {
        method: 'POST',
        headers: { 'content-type': 'application/json' },
        body: JSON.stringify({ tabId, stepId }),
        signal,
      });
      const outcome = (await response.json()) as Outcome<Presence>;
      if (!outcome.ok) throw new Error(outcome.sentence);
      return outcome.value;
    },
  });
  return query.data ?? null;
}

'use client';

import { useDeferredValue, useMemo, useState, useSyncExternalStore } from 'react';
import type { DraftPage } from '@/lib/contracts/sequence-draft';
import { predictSequence } from '@/lib/prediction/predict-sequence';
import { StepMemo } from '@/lib/prediction/step-memo';
import { usualStation } from '@/lib/prediction/types';
import { checkSequence } from '@/lib/sequence/check-sequence';
import { compareSequences } from '@/lib/sequence/compare-sequences';
import type { Sequence } from '@/lib/sequence/step';

const never = () => () => {};
const yes = () => true;
const no = () => false;

/** What the rules say of the draft at a station, how it would run there, and what differs from the revision in use. */
export function useDraftFacts(page: DraftPage, sequence: Sequence, stationCode: string | null) {
  const { boardType, stations, released } = page;
  const station = stations.find(({ code }) => code === stationCode)?.station ?? usualStation;
  const [memo] = useState(() => new StepMemo());
  const findings = useMemo(() => checkSequence(sequence, boardType, station), [sequence, boardType, station]);
  const inUse = released?.sequence;
  const comparison = useMemo(() => (inUse ? compareSequences(inUse, sequence) : null), [inUse, sequence]);
  // A prediction takes up to a second at first: never in the server's process, and in the browser after what is typed.
  const inBrowser = useSyncExternalStore(never, yes, no);
  const settled = useDeferredValue(inBrowser ? sequence : null, null);
  const prediction = useMemo(
    () => (settled ? predictSequence(settled, boardType, station, memo) : null),
    [settled, boardType, station, memo],
  );
  const seconds = useMemo(() => {
    const all = new Map<string, number>();
    for (const { stepId, fromMs, toMs } of prediction?.steps ?? [])
      all.set(stepId, (all.get(stepId) ?? 0) + (toMs - fromMs) / 1000);
    return all;
  }, [prediction]);
  return { findings, comparison, prediction, seconds };
}

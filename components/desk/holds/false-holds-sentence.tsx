'use client';

import { useState } from 'react';
import { FillIn, FillInChoice } from '@/components/ui/fill-in';
import type { HoldRule } from '@/lib/statistics/charts/hold-rules';
import { count } from '../numbers';
import { useFalseHolds } from './use-false-holds';

const baselines = [
  { value: '30', label: 'its first 30 boards' },
  { value: '240', label: 'one earlier lot of 240' },
  { value: '720', label: 'three earlier lots of 240' },
  { value: 'known', label: 'values known exactly' },
];

/** Digits so that a rare hold does not read as none. */
const rate = (value: number) => (value === 0 ? 'no' : value < 0.1 ? value.toFixed(2) : value.toFixed(1));

/** What the run rules cost in a lot where nothing is wrong. `rules` null: a gap is not filled in yet. */
export function FalseHoldsSentence({ rules }: { rules: HoldRule[] | null }) {
  const [size, setSize] = useState('240');
  const [baseline, setBaseline] = useState('30');
  const boards = /^\d+$/.test(size.trim()) ? Number(size) : NaN;
  const sizeFits = boards >= 10 && boards <= 10_000;
  const question =
    rules && rules.length > 0 && sizeFits
      ? { boardsPerLot: boards, holdRules: rules, baselineBoards: baseline === 'known' ? null : Number(baseline) }
      : null;
  const { answer, working } = useFalseHolds(question);
  return (
    <div className="border-l-4 border-ink pl-4">
      <p className="flex flex-wrap items-center gap-2 text-ink-2">
        A stable lot of{' '}
        <FillIn
          label="Boards in a stable lot"
          value={size}
          onChange={(event) => setSize(event.target.value)}
          inputMode="numeric"
          size={5}
          aria-invalid={sizeFits ? undefined : true}
        />{' '}
        boards, its limits from{' '}
        <FillInChoice
          label="Where the limits come from"
          choices={baselines}
          value={baseline}
          onChange={(event) => setBaseline(event.target.value)}
        />
      </p>
      <p className="mt-2 min-h-[2.6em] text-lead" aria-live="polite">
        {!sizeFits ? (
          'Enter 10 to 10 000 boards.'
        ) : rules === null ? (
          'Fill in the gaps of the rules above.'
        ) : rules.length === 0 ? (
          'Without a run rule, no drift of the trip points holds a lot.'
        ) : answer === null ? (
          'Working it out.'
        ) : (
          <span className={working ? 'text-ink-2' : ''}>
            <b>{rate(answer.holdsPerLot)}</b> holds per lot of {count(boards)} boards;{' '}
            <b>{Math.round(answer.lotsHeld.share * 100)}</b> stable lots in 100 are held for nothing.
          </span>
        )}
      </p>
      <p className="text-cap text-ink-2">
        Simulated stable lots with independent normal values; run rules only.
        {answer && question
          ? ` Between ${Math.round(answer.lotsHeld.low * 100)} and ${Math.round(answer.lotsHeld.high * 100)} in 100, with 95 % confidence.`
          : ''}
      </p>
    </div>
  );
}

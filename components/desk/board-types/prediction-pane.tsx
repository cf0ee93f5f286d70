'use client';

import { ReleaseHistogram } from '@/components/charts/release-histogram';
import { TravelPrediction } from '@/components/charts/travel-prediction';
import { Button } from '@/components/ui/button';
import { LoadingTicks } from '@/components/ui/loading-ticks';
import { VerdictMark } from '@/components/ui/verdict-mark';
import { driverSentence, fixLabel, fixSentence, missSentence } from '@/lib/circuit/monte-carlo/finding-words';
import type { BoardTypePrediction, LimitFinding, LimitFix } from '@/lib/circuit/monte-carlo/types';
import type { BoardType } from '@/lib/contracts/board-type';
import { focusField } from './form-context';

interface PredictionPaneProps {
  boardType: BoardType;
  prediction: BoardTypePrediction | null;
  working: boolean;
  unit: 'turns' | 'degrees';
  /** Null: it can only be read. */
  onFix: ((fix: LimitFix) => void) | null;
}

const limitPaths = {
  target: 'limits.tripVolts.min',
  release: 'limits.releaseVolts.max',
  hysteresis: 'limits.hysteresisVolts.max',
  reference: 'limits.referenceVolts.max',
} as const;

/** What the parts make of the limits, beside what is typed. */
export function PredictionPane({ boardType: { limits }, prediction, working, unit, onFix }: PredictionPaneProps) {
  if (!prediction) return <LoadingTicks label="Working out 20 000 boards" />;
  const { travel, typicalTurns, release, targetVolts, boards, findings } = prediction;
  return (
    <div className="grid gap-5" aria-busy={working}>
      <TravelPrediction travel={travel} limits={limits} typicalTurns={typicalTurns} unit={unit} />
      <ReleaseHistogram histogram={release} limits={limits.releaseVolts} targetVolts={targetVolts} boards={boards} />
      {findings.length > 0 ? (
        <NotMet findings={findings} targetVolts={targetVolts} onFix={onFix} />
      ) : (
        <p className="flex items-start gap-2">
          <VerdictMark shape="pass" size={16} />
          <span>
            Trimmed to {targetVolts.toFixed(2)} V, fewer than 1 board in 1,000 misses a limit by its parts alone.
          </span>
        </p>
      )}
      <p role="status" className="min-h-5 text-cap text-ink-2">
        {working ? 'Working it out again.' : ''}
      </p>
    </div>
  );
}

interface NotMetProps {
  findings: LimitFinding[];
  targetVolts: number;
  onFix: ((fix: LimitFix) => void) | null;
}

function NotMet({ findings, targetVolts, onFix }: NotMetProps) {
  return (
    <section aria-label="Limits cannot be met" className="grid gap-3 border-2 border-reject px-4 py-3">
      <h3 className="flex items-center gap-2.5 text-[20px] leading-tight font-bold text-reject">
        <VerdictMark shape="reject" size={18} />
        Limits cannot be met
      </h3>
      {findings.map((finding) => (
        <div key={finding.quantity} className="grid gap-2">
          <p>
            {missSentence(finding, targetVolts)} {driverSentence(finding)}
            {finding.fix ? ` ${fixSentence(finding.fix)}` : ''}
          </p>
          {onFix ? (
            <div className="flex flex-wrap gap-3">
              {finding.fix && finding.fix.kind !== 'target' ? (
                <Button kind="filled" onClick={() => onFix(finding.fix!)}>
                  {fixLabel(finding.fix)}
                </Button>
              ) : null}
              <Button onClick={() => focusField(limitPaths[finding.quantity])}>Change the limits…</Button>
            </div>
          ) : null}
        </div>
      ))}
    </section>
  );
}

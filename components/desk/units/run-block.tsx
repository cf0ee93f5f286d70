import { TraceChart } from '@/components/charts/trace-chart';
import { TrialMark } from '@/components/ui/trial-mark';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { UnitRun } from '@/lib/contracts/unit-page';
import { volts } from '../numbers';
import { Time } from '../time';
import { causeWords, noVerdictWords, rejectWords, verdictWords } from '../words';
import { AllMeasurements, MeasuredTable } from './measured-table';
import { adjustmentText } from './turn-text';

const tones = { pass: 'text-pass', reject: 'text-reject', 'no-verdict': 'text-ink' };
const shapes = { pass: 'pass', reject: 'reject', 'no-verdict': 'check' } as const;

/** One attempt: verdict, where and when, values against limits, trace, adjustments. */
export function RunBlock({ run, mostSeconds }: { run: UnitRun; mostSeconds: number }) {
  const last = (quantity: string) => run.measurements.findLast((m) => m.quantity === quantity)?.value ?? null;
  const [trip, release] = [last('trip-volts'), last('release-volts')];
  const engineering = run.kind === 'engineering';
  return (
    <section
      className="border-t-2 border-ink pt-3 pb-6 first:border-0 first:pt-0"
      aria-label={engineering ? `Engineering run ${run.attempt}` : `Attempt ${run.attempt}`}
    >
      {engineering ? (
        <p className="mb-1 inline-flex items-center gap-2 border-2 border-dashed border-ink px-2 py-0.5 font-bold">
          <TrialMark size={18} /> Engineering run {run.attempt}. Not production.
        </p>
      ) : null}
      <h2 className="flex flex-wrap items-center gap-x-4 gap-y-1">
        {engineering ? null : <span className="text-lead font-bold">{run.attempt}</span>}
        {run.verdict ? (
          <span className={`inline-flex items-center gap-2 text-lead font-bold ${tones[run.verdict]}`}>
            <VerdictMark shape={shapes[run.verdict]} size={20} />
            {verdictWords[run.verdict]}
          </span>
        ) : (
          <b className="text-lead">In test</b>
        )}
        <span className="text-ink-2">
          <Time iso={run.startedIso} format="second" />, station {run.stationCode}, {run.fixture},{' '}
          {run.sequenceRevision}
          {run.seconds === null ? '' : `, ${Math.round(run.seconds)} s`}, operator{' '}
          {run.operatorNumber ?? run.operatorName}
        </span>
      </h2>
      <RunNotes run={run} />
      <div className="mt-1 grid items-start gap-y-3 xl:grid-cols-[minmax(0,432px)_minmax(0,1fr)] gap-x-6">
        <MeasuredTable run={run} />
        {run.traces.length > 0 ? (
          <TraceChart
            traces={run.traces}
            limits={run.limits}
            tripVolts={trip}
            releaseVolts={release}
            mostSeconds={mostSeconds}
            label={`Supply over time in attempt ${run.attempt}${trip !== null ? `, trip ${volts(trip)} V` : ''}${release !== null ? `, release ${volts(release)} V` : ''}`}
          />
        ) : null}
      </div>
      {run.adjustments.length > 0 ? (
        <>
          <h3 className="mt-3 font-bold">Adjustments</h3>
          <ol className="mt-1">
            {run.adjustments.map((adjustment, i) => (
              <li key={i} className="flex gap-4">
                <span className="w-16 flex-none text-right font-num text-ink-2">
                  {(adjustment.atMs / 1000).toFixed(1)} s
                </span>
                {adjustmentText(adjustment)}
              </li>
            ))}
          </ol>
        </>
      ) : null}
      {run.measurements.length > 0 ? <AllMeasurements run={run} /> : null}
    </section>
  );
}

/** Why it was rejected or broke off, and how the supply was left. */
function RunNotes({ run }: { run: UnitRun }) {
  const { rejectReason, likelyCause, noVerdictReason, supplyOff, faultCode, faultDetail } = run;
  return (
    <div className="my-1 grid gap-0.5">
      {rejectReason ? (
        <p>
          <b>{rejectWords[rejectReason]}.</b>
          {likelyCause ? ` Likely: ${causeWords[likelyCause]}.` : ''}
          {run.binCode || run.kind === 'engineering' ? '' : ' The red bin was not scanned.'}
        </p>
      ) : null}
      {noVerdictReason ? (
        <p>
          <b>{noVerdictWords(noVerdictReason)}.</b> {faultCode ? `${faultCode}. ` : ''}
          {faultDetail ?? ''}
        </p>
      ) : null}
      {run.failingWhenStopped ? (
        <p className="flex items-center gap-2">
          <VerdictMark shape="check" size={15} /> <b>Failing when stopped:</b> what was measured already cannot be
          trimmed right.
        </p>
      ) : null}
      {supplyOff && !supplyOff.confirmed ? (
        <p className="flex items-center gap-2">
          <VerdictMark shape="check" size={15} /> The supply was not confirmed off at the end of this run.
        </p>
      ) : null}
      {run.closedBy === 'recovery' ? <p className="text-ink-2">Closed when the server started again.</p> : null}
      {run.closedBy === 'journal' ? <p className="text-ink-2">Stored from the station’s journal.</p> : null}
    </div>
  );
}

import { Table, Td, Th } from '@/components/ui/table';
import type { DryRunResult, DryRunSide, Share } from '@/lib/contracts/dry-run';
import type { Sequence } from '@/lib/sequence/step';
import { stepWord } from '@/lib/sequence/value-words';
import { count, percent } from '../numbers';
import { rejectWords } from '../words';

interface RunTablesProps {
  result: DryRunResult;
  sequence: Sequence;
  draftName: string;
  releasedName: string | null;
}

const ofAll = ({ count: some, of }: Share) => (of === 0 ? '–' : `${count(some)} of ${count(of)}`);
const interval = ({ low, high }: Share) => `${percent(low)} to ${percent(high)}`;

/** Everything the charts show, in numbers. */
export function RunFigures({ result, draftName, releasedName }: RunTablesProps) {
  const sides: [string, DryRunSide][] = [
    [draftName, result.draft],
    ...(result.released && releasedName ? ([[releasedName, result.released]] as [string, DryRunSide][]) : []),
  ];
  const rows: [string, (side: DryRunSide) => string][] = [
    ['Pass first time', ({ firstPass }) => ofAll(firstPass)],
    ['Yield', ({ firstPass }) => (firstPass.of ? percent(firstPass.count / firstPass.of) : '–')],
    ['95 % interval (Wilson)', ({ firstPass }) => interval(firstPass)],
    ['Good boards rejected', ({ falseRejects }) => ofAll(falseRejects)],
    ['Bad boards passed', ({ falseAccepts }) => ofAll(falseAccepts)],
    ['No verdict', ({ noVerdict }) => count(noVerdict)],
    ['Station alone, a board', ({ stationSeconds }) => `${stationSeconds.toFixed(1)} s`],
    ['With the operator, a board', ({ boardSeconds }) => `${boardSeconds.toFixed(1)} s`],
  ];
  const { pair } = result;
  return (
    <>
      <Table stacks={false}>
        <thead>
          <tr>
            <Th>Figure</Th>
            {sides.map(([name]) => (
              <Th key={name} number>
                {name}
              </Th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(([label, of]) => (
            <tr key={label}>
              <Td>{label}</Td>
              {sides.map(([name, side]) => (
                <Td key={name} number>
                  {of(side)}
                </Td>
              ))}
            </tr>
          ))}
        </tbody>
      </Table>
      {pair ? (
        <p className="mt-2">
          The same boards for both: {count(pair.onlyDraft)} pass with {draftName} only, {count(pair.onlyReleased)} with{' '}
          {releasedName} only. Difference {signedPoints(pair.difference.value)}, 95 % interval{' '}
          {signedPoints(pair.difference.low)} to {signedPoints(pair.difference.high)} points (Newcombe, paired).
        </p>
      ) : null}
    </>
  );
}

const signedPoints = (share: number) => `${share < 0 ? '−' : '+'}${Math.abs(share * 100).toFixed(1)}`;

/** Rejects by reason and step, the released revision beside. */
export function RunReasons({ result, sequence, draftName, releasedName }: RunTablesProps) {
  const { draft, released } = result;
  const keyOf = ({ reason, stepId }: DryRunSide['reasons'][number]) => `${reason}:${stepId}`;
  const rows = new Map([...(released?.reasons ?? []), ...draft.reasons].map((each) => [keyOf(each), each]));
  const boards = (side: DryRunSide | null, key: string) =>
    side?.reasons.find((each) => keyOf(each) === key)?.boards ?? 0;
  if (rows.size === 0) return <p>No board was rejected.</p>;
  const listed = [...rows].sort(([a], [b]) => boards(draft, b) - boards(draft, a) || (a < b ? -1 : 1));
  return (
    <Table stacks={false}>
      <thead>
        <tr>
          <Th>Reason</Th>
          <Th>Step</Th>
          <Th number>{draftName}</Th>
          {released ? <Th number>{releasedName}</Th> : null}
        </tr>
      </thead>
      <tbody>
        {listed.map(([key, { reason, stepId }]) => {
          const place = sequence.steps.findIndex(({ id }) => id === stepId);
          return (
            <tr key={key}>
              <Td>{rejectWords[reason]}</Td>
              <Td>{place < 0 ? '–' : `${place + 1} ${stepWord(sequence.steps[place]!)}`}</Td>
              <Td number>{count(boards(draft, key))}</Td>
              {released ? <Td number>{count(boards(released, key))}</Td> : null}
            </tr>
          );
        })}
      </tbody>
    </Table>
  );
}

/** Verified values in bins of 20 mV, so that the table stays short. */
export function RunSpreads({ result, draftName, releasedName }: Omit<RunTablesProps, 'sequence'>) {
  return (
    <div className="grid gap-x-10 gap-y-4 sm:grid-cols-2">
      {(['trip', 'release'] as const).map((side) => {
        const draft = coarse(result.draft[side]);
        const released = result.released ? coarse(result.released[side]) : null;
        const steps = [...new Set([...draft.keys(), ...(released?.keys() ?? [])])].sort((a, b) => a - b);
        return (
          <Table key={side} stacks={false}>
            <thead>
              <tr>
                <Th>{side === 'trip' ? 'Trip, V' : 'Release, V'}</Th>
                <Th number>{draftName}</Th>
                {released ? <Th number>{releasedName}</Th> : null}
              </tr>
            </thead>
            <tbody>
              {steps.map((step) => (
                <tr key={step}>
                  <Td>
                    {(step * coarseVolts).toFixed(2)} to {((step + 1) * coarseVolts).toFixed(2)}
                  </Td>
                  <Td number>{count(draft.get(step) ?? 0)}</Td>
                  {released ? <Td number>{count(released.get(step) ?? 0)}</Td> : null}
                </tr>
              ))}
            </tbody>
          </Table>
        );
      })}
    </div>
  );
}

const coarseVolts = 0.02;

function coarse({ from, width, counts }: DryRunSide['trip']): Map<number, number> {
  const boards = new Map<number, number>();
  counts.forEach((some, i) => {
    if (some === 0) return;
    const step = Math.floor((from + (i + 0.5) * width) / coarseVolts);
    boards.set(step, (boards.get(step) ?? 0) + some);
  });
  return boards;
}

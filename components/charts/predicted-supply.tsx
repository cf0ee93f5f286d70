'use client';

import { scaleLinear } from 'd3-scale';
import { useId, type KeyboardEvent, type ReactNode } from 'react';
import { Table, Td, Th } from '@/components/ui/table';
import type { Prediction } from '@/lib/prediction/types';
import { ChartWithTable } from './chart-with-table';
import { LimitBands, LimitNames, LoadBar, SecondsAxis, StepNumbers, VoltsAxis } from './predicted-supply-parts';
import { height, stepPath, voltScale, type PointLimits } from './predicted-supply-scale';
import { useElementWidth } from './quality/use-element-width';

interface PredictedSupplyProps {
  prediction: Prediction;
  /** Drawn dashed behind it, such as the revision compared with. */
  comparison?: { name: string; prediction: Prediction };
  limits: PointLimits;
  /** All steps of the draft, as they are numbered and called there. */
  steps: readonly { id: string; number: number; name: string }[];
  selectedId: string | null;
  /** A stretch was clicked or reached by the arrow keys. Absent: the chart is only looked at. */
  onSelect?(stepId: string): void;
  title?: ReactNode;
  note?: ReactNode;
}

const left = 46;
const right = 12;
const seconds = (ms: number) => (ms / 1000).toFixed(1);

/** The supply over one typical board, in steps, over the limits of the points; each stretch belongs to a step. */
export function PredictedSupply(props: PredictedSupplyProps) {
  const { prediction, comparison, steps } = props;
  const nameOf = new Map(steps.map((step) => [step.id, step]));
  return (
    <ChartWithTable
      title={props.title ?? 'Predicted supply'}
      note={props.note ?? (comparison ? `dashed: ${comparison.name}` : 'drawn from the steps above, one typical board')}
      table={
        <Table>
          <thead>
            <tr>
              <Th number>Step</Th>
              <Th>Name</Th>
              <Th number>From, s</Th>
              <Th number>Station, s</Th>
              <Th number>Person, s</Th>
            </tr>
          </thead>
          <tbody>
            {prediction.steps.map(({ stepId, fromMs, stationMs, personMs }, i) => (
              <tr key={i}>
                <Td number label="Step">
                  {nameOf.get(stepId)?.number}
                </Td>
                <Td label="Name">{nameOf.get(stepId)?.name}</Td>
                <Td number label="From, s">
                  {seconds(fromMs)}
                </Td>
                <Td number label="Station, s">
                  {seconds(stationMs)}
                </Td>
                <Td number label="Person, s">
                  {seconds(personMs)}
                </Td>
              </tr>
            ))}
          </tbody>
        </Table>
      }
    >
      <Drawing {...props} />
      <EndingNote {...props} />
    </ChartWithTable>
  );
}

function Drawing({ prediction, comparison, limits, steps, selectedId, onSelect }: PredictedSupplyProps) {
  const [box, measured] = useElementWidth<HTMLDivElement>(800);
  const width = Math.max(300, measured);
  const id = useId();
  const all = comparison ? [prediction, comparison.prediction] : [prediction];
  const lastMs = Math.max(1, ...all.map(({ totalMs }) => totalMs));
  const x = scaleLinear([0, lastMs], [left, width - right]);
  const scale = voltScale(limits, all);
  const nameOf = new Map(steps.map((step) => [step.id, step]));
  const stretches = prediction.steps.map((step, i) => ({
    ...step,
    optionId: `${id}-${i}`,
    number: nameOf.get(step.stepId)?.number ?? 0,
    name: nameOf.get(step.stepId)?.name ?? '',
  }));
  const chosen = stretches.findIndex(({ stepId }) => stepId === selectedId);

  function walk(event: KeyboardEvent) {
    const last = stretches.length - 1;
    const to = { ArrowLeft: chosen - 1, ArrowRight: chosen + 1, Home: 0, End: last }[event.key];
    if (to === undefined || !onSelect) return;
    event.preventDefault();
    const stretch = stretches[Math.min(last, Math.max(0, to))];
    if (stretch) onSelect(stretch.stepId);
  }

  const choice = onSelect ? ({ role: 'listbox', tabIndex: 0, onKeyDown: walk } as const) : ({ role: 'list' } as const);
  return (
    <div ref={box}>
      <svg
        {...choice}
        viewBox={`0 0 ${width} ${height}`}
        width={width}
        height={height}
        className="block max-w-full"
        aria-label={`Predicted supply over ${seconds(prediction.totalMs)} seconds, by step`}
        aria-activedescendant={onSelect && chosen >= 0 ? stretches[chosen]!.optionId : undefined}
      >
        <g aria-hidden="true">
          <LimitBands limits={limits} y={scale.y} left={left} right={width - right} />
          <VoltsAxis {...scale} left={left} />
        </g>
        <StepNumbers
          stretches={stretches}
          selectedId={selectedId}
          x={x}
          bottom={scale.bottom}
          role={onSelect ? 'option' : 'listitem'}
          onSelect={onSelect}
        />
        <g aria-hidden="true" pointerEvents="none">
          {comparison ? (
            <path
              d={stepPath(comparison.prediction, x, scale.y)}
              fill="none"
              stroke="var(--sw-ink-2)"
              strokeDasharray="4 3"
            />
          ) : null}
          <path d={stepPath(prediction, x, scale.y)} fill="none" stroke="var(--sw-ink)" strokeWidth={1.6} />
          {prediction.flips.map(({ atMs, volts, point }, i) => (
            <path
              key={i}
              d={`M${x(atMs) - 4} ${scale.y(volts) + (point === 'trip' ? -4 : 4)}h8l-4 ${point === 'trip' ? 7 : -7}z`}
              fill={`var(--sw-${point})`}
            />
          ))}
          <LimitNames limits={limits} y={scale.y} left={left} right={width - right} />
          <LoadBar stretches={prediction.loadOn} x={x} left={left} right={width - right} top={scale.bottom + 12} />
          <SecondsAxis x={x} lastMs={lastMs} width={width} />
        </g>
      </svg>
    </div>
  );
}

/** Said where a typical board would not pass. */
function EndingNote({ prediction: { ending }, steps }: PredictedSupplyProps) {
  if (ending.verdict === 'pass') return null;
  const step = steps.find(({ id }) => id === ending.stepId);
  const where = step ? ` at step ${step.number}, ${step.name}` : '';
  return (
    <p className="m-0 pt-1 text-body">
      {ending.verdict === 'reject'
        ? `A typical board would be rejected${where}.`
        : `A typical board would end without a verdict${where}.`}
    </p>
  );
}

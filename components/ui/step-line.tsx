import { Tick } from './tick';

export interface StepLineItem {
  key: string;
  label: string;
  state: 'done' | 'current' | 'ahead';
}

/** Steps on one line: done stands on a thick base with a tick, the current word between jaws, the rest on a thin line. */
export function StepLine({ steps, label }: { steps: readonly StepLineItem[]; label: string }) {
  return (
    <ol aria-label={label} className="sw-step-line">
      {steps.map((step) => (
        <li key={step.key} data-state={step.state} aria-current={step.state === 'current' ? 'step' : undefined}>
          {step.state === 'done' && <Tick />}
          <span>{step.label}</span>
        </li>
      ))}
      <li aria-hidden="true" data-state="rest" data-after={steps.at(-1)?.state} />
    </ol>
  );
}

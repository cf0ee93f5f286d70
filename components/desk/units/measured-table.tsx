import { PointMark } from '@/components/ui/point-mark';
import { Table, Td, Th } from '@/components/ui/table';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { UnitMeasurement, UnitRun } from '@/lib/contracts/unit-page';
import { inSpokenUnit, limitsText } from '../numbers';
import { quantityWords } from '../words';
import { turnText } from './turn-text';

const order: UnitMeasurement['quantity'][] = [
  'trip-volts',
  'release-volts',
  'hysteresis-volts',
  'trip-spread-volts',
  'reference-volts',
  'output-high-drop-volts',
  'output-low-volts',
  'quiescent-amps',
  'ride-through-seconds',
  'channel-volts',
  'drift-volts',
  'supply-amps',
  'contact-milliohms',
  'operator-check',
];
const phaseWords = { found: 'found', trimmed: 'after trim', verified: 'verified', check: 'check' };

/** Measured by as many steps as a sequence has of them: each keeps its own row. */
const byStep: readonly UnitMeasurement['quantity'][] = ['channel-volts', 'drift-volts'];

/** The last value of each quantity, of channels and drifts that of each step, in the order in which people look for them. */
export function lastOfEach(measurements: readonly UnitMeasurement[]): UnitMeasurement[] {
  return order.flatMap((quantity) => {
    const all = measurements.filter((m) => m.quantity === quantity);
    const isLast = (m: UnitMeasurement, i: number) =>
      !all.slice(i + 1).some(({ step }) => !byStep.includes(quantity) || step === m.step);
    return all.filter(isLast);
  });
}

/** U, rounded up, one unit finer than the value where that is a voltage. */
function uncertaintyText({ quantity, expandedUncertainty }: UnitMeasurement): string {
  if (expandedUncertainty === null) return '';
  const up = (value: number, digits: number) => (Math.ceil(value * 10 ** digits - 1e-9) / 10 ** digits).toFixed(digits);
  if (quantity.endsWith('-volts')) return `${up(expandedUncertainty * 1_000, 1)} mV`;
  const { scale, digits, unit } = inSpokenUnit(quantity, 0);
  return `${up(expandedUncertainty * scale, digits + 1)} ${unit}`;
}

function Name({ quantity, step }: Pick<UnitMeasurement, 'quantity' | 'step'>) {
  if (byStep.includes(quantity)) return `${quantityWords[quantity]}, ${step}`;
  const side = quantity === 'trip-volts' ? 'trip' : quantity === 'release-volts' ? 'release' : null;
  if (!side) return quantityWords[quantity];
  return (
    <b className={`inline-flex items-center gap-1.5 ${side === 'trip' ? 'text-trip' : 'text-release'}`}>
      <PointMark point={side} /> {quantityWords[quantity]}
    </b>
  );
}

export function MeasuredValue({ measurement }: { measurement: UnitMeasurement }) {
  if (measurement.quantity === 'operator-check') return <b>{measurement.value > 0 ? 'yes' : 'no'}</b>;
  const { text, unit } = inSpokenUnit(measurement.quantity, measurement.value);
  return (
    <span className={`inline-flex items-center gap-1.5 font-bold ${measurement.passed === false ? 'text-reject' : ''}`}>
      {measurement.passed === false ? <VerdictMark shape="reject" size={13} label="outside its limits" /> : null}
      {unit ? `${text} ${unit}` : text}
    </span>
  );
}

/** Limits and measured values of a run, with expanded uncertainty; a value outside its limits carries the square. */
export function MeasuredTable({ run }: { run: UnitRun }) {
  const rows = lastOfEach(run.measurements);
  if (rows.length === 0) return <p className="text-ink-2">Nothing was measured.</p>;
  const { adjustments, turnsAdvised } = run;
  return (
    <Table
      stacks={false}
      aria-label={`Measured values of attempt ${run.attempt}; U is the expanded uncertainty, about 95 %`}
      className="[&_.num]:whitespace-nowrap"
    >
      <thead>
        <tr>
          <Th>
            <span className="sr-only">Quantity</span>
          </Th>
          <Th className="num">
            <span className="font-text">Limits</span>
          </Th>
          <Th className="num">
            <span className="font-text">Measured</span>
          </Th>
          <Th className="num">
            <span className="font-text">U</span>
          </Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((measurement) => (
          <tr key={measurement.n}>
            <Td className="whitespace-nowrap">
              <Name {...measurement} />
            </Td>
            <Td number>
              {measurement.quantity === 'operator-check'
                ? ''
                : limitsText(measurement.quantity, measurement.min, measurement.max)}
            </Td>
            <Td number>
              <MeasuredValue measurement={measurement} />
            </Td>
            <Td number>
              <span className="text-ink-2">{uncertaintyText(measurement)}</span>
            </Td>
          </tr>
        ))}
        {turnsAdvised ? (
          <tr>
            <Td>Trim</Td>
            <Td number>≤ 4 turns</Td>
            <Td number>
              <b>{adjustments.length === 1 ? turnText(adjustments[0]!) : `${turnsAdvised.toFixed(2)} turns`}</b>
            </Td>
            <Td />
          </tr>
        ) : null}
      </tbody>
    </Table>
  );
}

/** Every single measurement in its order, with limits as judged. */
export function AllMeasurements({ run }: { run: UnitRun }) {
  return (
    <details className="mt-2">
      <summary className="sw-link w-fit cursor-pointer">All {run.measurements.length} measurements</summary>
      <Table aria-label={`All measurements of attempt ${run.attempt}`}>
        <thead>
          <tr>
            <Th>Quantity</Th>
            <Th>When</Th>
            <Th>Value</Th>
            <Th>U</Th>
            <Th>Limits</Th>
            <Th>As judged</Th>
            <Th>Settles</Th>
          </tr>
        </thead>
        <tbody>
          {run.measurements.map((m) => (
            <tr key={m.n}>
              <Td label="Quantity">{quantityWords[m.quantity]}</Td>
              <Td label="When">{phaseWords[m.phase]}</Td>
              <Td label="Value" className="font-num">
                <MeasuredValue measurement={m} />
              </Td>
              <Td label="U" className="font-num">
                {uncertaintyText(m)}
              </Td>
              <Td label="Limits" className="font-num">
                {limitsText(m.quantity, m.min, m.max)}
              </Td>
              <Td label="As judged" className="font-num">
                {limitsText(m.quantity, m.guardedMin, m.guardedMax)}
              </Td>
              <Td label="Settles" className="font-num">
                {m.settles ?? ''}
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </details>
  );
}

import { PointMark } from '@/components/ui/point-mark';
import { Table, Td, Th } from '@/components/ui/table';
import { valueText } from '@/lib/certificate/value-text';
import type { CertifiedValue } from '@/lib/contracts/certificate';

/** Limits and results as they are printed. */
export function VerifiedValues({ values }: { values: readonly CertifiedValue[] }) {
  return (
    <Table stacks={false} aria-label="Limits and measured values">
      <thead>
        <tr>
          <Th>
            <span className="sw-only-read">Result</span>
          </Th>
          <Th number>
            <span className="font-text">Limits</span>
          </Th>
          <Th number>
            <span className="font-text">Measured</span>
          </Th>
        </tr>
      </thead>
      <tbody>
        {values.map((value) => {
          const { name, limits, value: measured } = valueText(value);
          const side = value.quantity === 'trip-volts' ? 'trip' : value.quantity === 'release-volts' ? 'release' : null;
          return (
            <tr key={`${value.quantity} ${value.step}`}>
              <Td>
                <span
                  className={
                    side
                      ? `inline-flex items-center gap-1.5 font-bold ${side === 'trip' ? 'text-trip' : 'text-release'}`
                      : ''
                  }
                >
                  {side ? <PointMark point={side} /> : null}
                  {name}
                </span>
              </Td>
              <Td number>{limits}</Td>
              <Td number>
                <b>{measured}</b>
                {value.passed === false ? <span className="block font-text text-cap">outside</span> : null}
              </Td>
            </tr>
          );
        })}
      </tbody>
    </Table>
  );
}

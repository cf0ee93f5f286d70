'use client';

import { PointMark } from '@/components/ui/point-mark';
import { Table, Td, Th } from '@/components/ui/table';
import type { LimitRow, NumberField } from '@/lib/board-type/fields';
import { FieldSays } from './field-says';
import { useBoardTypeForm } from './form-context';
import { QuantityInput } from './quantity-input';

/** Rows with a lower and an upper limit, or one of them. */
export function LimitTable({ caption, rows }: { caption: string; rows: readonly LimitRow[] }) {
  return (
    <Table aria-label={caption}>
      <thead>
        <tr>
          <Th>Quantity</Th>
          <Th>At least</Th>
          <Th>At most</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map(({ name, point, min, max }) => (
          <tr key={name}>
            <Td label="Quantity">
              <span>
                {point ? <PointMark point={point} /> : null} {name}
              </span>
            </Td>
            <LimitCell label="At least" field={min} />
            <LimitCell label="At most" field={max} />
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function LimitCell({ label, field }: { label: string; field: NumberField | undefined }) {
  const { sentenceOf } = useBoardTypeForm();
  if (!field)
    return (
      <Td label={label} className="text-ink-3">
        –
      </Td>
    );
  return (
    <Td label={label}>
      <QuantityInput field={field} />
      {sentenceOf(field.path) ? (
        <div className="mt-1 max-w-72">
          <FieldSays path={field.path} />
        </div>
      ) : null}
    </Td>
  );
}

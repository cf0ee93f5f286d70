'use client';

import type { NumberField } from '@/lib/board-type/fields';
import { FieldSays } from './field-says';
import { QuantityInput } from './quantity-input';

/** A name, its values on one line, and what is wrong with them below. */
export function QuantityRow({ name, fields }: { name: string; fields: readonly NumberField[] }) {
  return (
    <div className="grid content-start gap-0.5">
      <span className="text-cap text-ink-2">{name}</span>
      <span className="flex flex-wrap gap-1">
        {fields.map((field) => (
          <QuantityInput key={field.path} field={field} />
        ))}
      </span>
      {fields.map(({ path }) => (
        <FieldSays key={path} path={path} />
      ))}
    </div>
  );
}

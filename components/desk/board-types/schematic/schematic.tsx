'use client';

import { useState, type CSSProperties } from 'react';
import { drawnParts, travelFields, type CircuitPart } from '@/lib/board-type/fields';
import { FieldSays } from '../field-says';
import { focusField, useBoardTypeForm } from '../form-context';
import { QuantityInput } from '../quantity-input';
import { drawingHeight, drawingWidth, partPlaces } from './part-places';
import { Wires } from './wires';

/**
 * The circuit with its values where its parts are drawn; the tab key goes through them from left to right. Where there is no room
 * for the fields in the drawing, they stand below it in the same order.
 */
export function Schematic() {
  const { form } = useBoardTypeForm();
  const [selected, setSelected] = useState<string | null>(null);
  const { travel } = travelFields(form.travelUnit);
  const parts: CircuitPart[] = drawnParts.flatMap((part) =>
    part.id === 'trimmer' ? [part, { id: 'travel', name: '', fields: [travel] }] : [part],
  );
  const [x, y, width, height] = partPlaces[selected ?? '']?.symbol ?? [0, 0, 0, 0];
  return (
    <div className="@container">
      <div
        className="relative"
        onBlur={(event) => {
          if (!event.currentTarget.contains(event.relatedTarget)) setSelected(null);
        }}
      >
        <svg viewBox={`0 0 ${drawingWidth} ${drawingHeight}`} aria-hidden="true" className="block w-full max-w-[856px]">
          <Wires />
          {selected ? (
            <rect
              x={x - 2}
              y={y - 2}
              width={width + 4}
              height={height + 4}
              fill="none"
              stroke="var(--sw-accent)"
              strokeWidth={4}
            />
          ) : null}
          {drawnParts.map(({ id, fields }) => {
            const [left, top, wide, high] = partPlaces[id]!.symbol;
            return (
              <rect
                key={id}
                x={left - 6}
                y={top - 6}
                width={wide + 12}
                height={high + 12}
                fill="transparent"
                className="cursor-pointer"
                onClick={() => focusField(fields[0]!.path)}
              />
            );
          })}
        </svg>
        <div className="mt-3 grid grid-cols-[repeat(auto-fill,minmax(200px,1fr))] gap-3 @min-[840px]:mt-0 @min-[840px]:contents">
          {parts.map((part) => (
            <PartFields key={part.id} part={part} onFocus={() => setSelected(part.id)} />
          ))}
        </div>
      </div>
      <div className="hidden gap-1 pt-1 @min-[840px]:grid">
        {parts.flatMap(({ fields }) =>
          fields.map(({ path, label }) => <FieldSays key={path} path={path} names={label} />),
        )}
      </div>
    </div>
  );
}

function PartFields({ part: { id, name, fields }, onFocus }: { part: CircuitPart; onFocus: () => void }) {
  const place = partPlaces[id]!;
  const at = { '--x': `${place.x}px`, '--y': `${place.y}px` } as CSSProperties;
  return (
    <div
      style={at}
      className="grid content-start gap-0.5 @min-[840px]:absolute @min-[840px]:top-(--y) @min-[840px]:left-(--x)"
    >
      {name ? <span className="text-[14px] leading-tight font-bold">{name}</span> : null}
      <span className={`flex gap-1 ${place.stacked ? '@min-[840px]:flex-col' : ''}`}>
        {fields.map((field) => (
          <QuantityInput key={field.path} field={field} onFocus={onFocus} />
        ))}
      </span>
      <div className="@min-[840px]:hidden">
        {fields.map(({ path }) => (
          <FieldSays key={path} path={path} />
        ))}
      </div>
    </div>
  );
}

'use client';

import { useId, useState, type ReactNode } from 'react';

interface ChartWithTableProps {
  title: ReactNode;
  /** At the right of the title. */
  note?: ReactNode;
  /** The same in numbers. */
  table: ReactNode;
  children: ReactNode;
}

/** A chart under its title, with its numbers behind "Show as table". */
export function ChartWithTable({ title, note, table, children }: ChartWithTableProps) {
  const [shown, setShown] = useState(false);
  const id = useId();
  return (
    <figure aria-labelledby={id} className="m-0">
      <figcaption className="flex flex-wrap items-baseline gap-x-6 border-t-2 border-ink pt-2 pb-1">
        <b id={id}>{title}</b>
        <span className="ms-auto text-caption text-ink-2">{note}</span>
        <button type="button" className="sw-link text-caption" aria-pressed={shown} onClick={() => setShown(!shown)}>
          Show as table
        </button>
      </figcaption>
      {shown ? table : children}
    </figure>
  );
}

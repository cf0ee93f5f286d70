import type { ReactNode } from 'react';

/** A sentence between dashed rules: what is missing, then what makes it appear. */
export function EmptyState({ title, children }: { title: string; children?: ReactNode }) {
  return (
    <div className="border-y border-dashed border-rule py-3.5">
      <p>
        <b>{title}</b> {children}
      </p>
    </div>
  );
}

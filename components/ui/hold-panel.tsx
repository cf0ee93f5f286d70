import type { ReactNode } from 'react';

/** A lot, board or station on hold: striped edge, amber wash, title, reason, then the moves. */
export function HoldPanel({ title, children, actions }: { title: string; children: ReactNode; actions?: ReactNode }) {
  return (
    <section className="sw-hold">
      <h2 className="text-lead font-bold">{title}</h2>
      <div className="mt-1">{children}</div>
      {actions ? <div className="mt-3 flex flex-wrap items-center gap-4">{actions}</div> : null}
    </section>
  );
}

import type { ReactNode } from 'react';

interface PageHeadProps {
  title: ReactNode;
  /** One line under the title. */
  lede?: ReactNode;
  /** Sub-pages, beside the title. */
  tabs?: ReactNode;
  /** Buttons at the right. */
  actions?: ReactNode;
}

/** Head of a desk page. */
export function PageHead({ title, lede, tabs, actions }: PageHeadProps) {
  return (
    <div className="mb-5 flex flex-wrap items-center justify-between gap-x-8 gap-y-3">
      <div className="flex flex-wrap items-baseline gap-x-9 gap-y-2">
        <h1 className="text-title font-bold leading-tight max-sm:text-[26px]">{title}</h1>
        {tabs}
        {lede ? <p className="w-full text-ink-2">{lede}</p> : null}
      </div>
      {actions ? <div className="flex flex-wrap gap-3">{actions}</div> : null}
    </div>
  );
}

/** A part of a page under a 2 px rule. */
export function Section({ title, aside, children }: { title: ReactNode; aside?: ReactNode; children: ReactNode }) {
  return (
    <section className="mt-8 border-t-2 border-ink pt-2.5">
      <div className="mb-2 flex flex-wrap items-baseline justify-between gap-4">
        <h2 className="text-body font-bold">{title}</h2>
        {aside}
      </div>
      {children}
    </section>
  );
}

/** The sentence with fill-in fields above a table: what is shown at the left, how many at the right. */
export function Toolbar({ children, count }: { children: ReactNode; count?: ReactNode }) {
  return (
    <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-y-2 border-ink py-2 text-ink-2">
      <div className="flex flex-wrap items-center gap-2">{children}</div>
      {count ? <div>{count}</div> : null}
    </div>
  );
}

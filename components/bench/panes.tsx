import type { ReactNode } from 'react';

/** Left pane 667 px wide, the words at its right. On a narrow screen the words come first. */
export function Panes({ left, children, wide = false }: { left: ReactNode; children: ReactNode; wide?: boolean }) {
  return (
    <div className="flex min-h-0 flex-1 max-[900px]:flex-col-reverse">
      <div
        className={`min-h-0 flex-none border-hair max-[900px]:w-full max-[900px]:border-t-2 min-[900px]:border-r-2 ${wide ? 'w-270' : 'w-166.75'}`}
      >
        {left}
      </div>
      <div className="relative flex min-w-0 flex-1 flex-col max-[900px]:py-4">{children}</div>
    </div>
  );
}

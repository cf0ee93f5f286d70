import type { ReactNode } from 'react';
import { VerdictMark } from './verdict-mark';

/** Something to look after that stops nobody: amber wash and bar, triangle and words. */
export function Notice({ children }: { children: ReactNode }) {
  return (
    <p role="status" className="flex items-center gap-2 border-l-[10px] border-attn bg-attn-wash px-3 py-2">
      <VerdictMark shape="check" size={15} />
      <span>{children}</span>
    </p>
  );
}

import type { ReactNode } from 'react';
import { VerdictMark } from '@/components/ui/verdict-mark';

/** What the marks of the charts mean. */
export function ChartKey() {
  return (
    <span className="flex flex-wrap gap-x-5 gap-y-1 text-cap text-ink-2">
      <Key word="rejected">
        <VerdictMark shape="reject" size={12} />
      </Key>
      <Key word="later attempt passed">
        <svg viewBox="0 0 10 16" width={10} height={16} aria-hidden="true">
          <path d="M5 16V8" stroke="var(--sw-ink)" strokeWidth={2} />
          <circle cx={5} cy={5} r={3.4} fill="var(--sw-paper)" stroke="var(--sw-ink)" strokeWidth={2} />
        </svg>
      </Key>
      <Key word="run">
        <svg viewBox="0 0 12 12" width={12} height={12} aria-hidden="true">
          <circle cx={6} cy={6} r={4.2} fill="var(--sw-attn)" stroke="var(--sw-on-attn)" strokeWidth={1.7} />
        </svg>
      </Key>
      <Key word="outside control limits">
        <svg viewBox="0 0 14 13" width={14} height={13} aria-hidden="true">
          <path
            d="M7 1l6 11H1z"
            fill="var(--sw-attn)"
            stroke="var(--sw-on-attn)"
            strokeWidth={1.6}
            strokeLinejoin="round"
          />
        </svg>
      </Key>
    </span>
  );
}

function Key({ word, children }: { word: string; children: ReactNode }) {
  return (
    <span className="inline-flex items-center gap-1.5">
      {children} {word}
    </span>
  );
}

import type { ReactNode } from 'react';
import { Mark } from '@/components/ui/mark';

const majorEvery = 5;
const ticks = Array.from({ length: 61 }, (_, i) => i);

/** Pages before signing in: the mark at full height beside a narrow column. */
export function Entrance({ title, children, foot }: { title: string; children: ReactNode; foot?: ReactNode }) {
  return (
    <main className="grid min-h-dvh grid-cols-[minmax(0,4fr)_minmax(0,5fr)] max-md:grid-cols-1">
      <div
        aria-hidden="true"
        className="relative flex flex-col justify-center gap-[9vh] overflow-hidden border-r-2 border-ink max-md:hidden"
      >
        <svg viewBox="0 0 48 38" className="w-full" preserveAspectRatio="none">
          <g fill="none" stroke="currentColor" strokeWidth={4.2}>
            <path d="M0 34H31V12" />
            <path d="M48 3H17V25" />
          </g>
        </svg>
        <svg viewBox="0 0 600 22" className="mx-[3%]">
          {ticks.map((i) => (
            <line
              key={i}
              x1={i * 9.95 + 1}
              x2={i * 9.95 + 1}
              y1={0}
              y2={i % (2 * majorEvery) === 0 ? 21 : i % majorEvery === 0 ? 15 : 9}
              stroke={i % (2 * majorEvery) === 0 ? 'var(--sw-ink)' : 'var(--sw-rule)'}
              strokeWidth={i % (2 * majorEvery) === 0 ? 2 : 1}
            />
          ))}
        </svg>
      </div>
      <div className="flex flex-col justify-center px-[clamp(18px,5vw,72px)] py-12">
        <div className="w-full max-w-[400px]">
          <p className="mb-12 flex items-center gap-4 text-[27px] font-bold">
            <Mark size={38} />
            Sillwright
          </p>
          <h1 className="mb-6 text-title font-bold leading-tight">{title}</h1>
          {children}
          {foot ? <div className="mt-9 border-t border-hair pt-4 text-cap text-ink-2">{foot}</div> : null}
        </div>
      </div>
    </main>
  );
}

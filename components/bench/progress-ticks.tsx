const ticks = 40;

/** A tick scale that fills with counts; without a known end one tick a count, starting again at the end of the scale. */
export function ProgressTicks({ done, of }: { done: number; of: number | null }) {
  const filled = of === null ? done % (ticks + 1) : Math.min(ticks, Math.round((done / Math.max(of, 1)) * ticks));
  return (
    <svg viewBox="0 0 900 36" aria-hidden="true" className="block h-auto w-full">
      {Array.from({ length: ticks + 1 }, (_, i) => (
        <path
          key={i}
          d={`M${3 + i * 22.3} ${i % 5 === 0 ? 2 : 16}V34`}
          stroke={i <= filled && done > 0 ? 'var(--sw-ink)' : 'var(--sw-rule)'}
          strokeWidth={i <= filled && done > 0 ? 5 : 2}
        />
      ))}
    </svg>
  );
}

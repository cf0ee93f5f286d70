interface LoadingTicksProps {
  /** Such as "Reading 240 records, 98 done". */
  label: string;
  done?: number;
  /** Unknown where left out; then no tick is filled. */
  of?: number;
}

const ticks = 40;

/** A tick scale that fills with counts. Shown after 400 ms only, so that quick loads show nothing. */
export function LoadingTicks({ label, done = 0, of = 0 }: LoadingTicksProps) {
  const filled = of > 0 ? Math.floor((Math.min(done, of) / of) * ticks) : -1;
  return (
    <div
      role="status"
      className="border-y border-dashed border-rule py-3.5 [animation:sw-appear_1ms_400ms_backwards] motion-reduce:[animation-duration:1ms]"
    >
      <svg viewBox="0 0 402 14" className="block h-3.5 w-full max-w-[402px]" aria-hidden="true">
        {Array.from({ length: ticks + 1 }, (_, i) => (
          <path
            key={i}
            d={`M${1 + i * 10} 0V${i % 5 === 0 ? 14 : 9}`}
            stroke={i <= filled ? 'var(--sw-ink)' : 'var(--sw-hair)'}
            strokeWidth={i <= filled ? 2 : 1}
          />
        ))}
      </svg>
      <p className="mt-1">{label}</p>
    </div>
  );
}

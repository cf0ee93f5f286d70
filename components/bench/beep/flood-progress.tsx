import { useEffect, useState } from 'react';

const ticks = 40;
/** What a reading after a beep usually takes. */
const expectedMs = 2400;

/** A tick scale that fills while the reading goes on. */
export function FloodProgress() {
  const [filled, setFilled] = useState(0);
  useEffect(() => {
    const timer = setInterval(() => setFilled((before) => Math.min(ticks, before + 1)), expectedMs / ticks);
    return () => clearInterval(timer);
  }, []);
  return (
    <svg viewBox="0 0 1180 36" aria-hidden="true" className="mt-2 block h-auto w-full">
      {Array.from({ length: ticks + 1 }, (_, i) => (
        <path
          key={i}
          d={`M${3 + i * 29.3} ${i % 5 === 0 ? 2 : 18}V34`}
          stroke="currentColor"
          strokeWidth={i <= filled ? 6 : 2}
        />
      ))}
    </svg>
  );
}

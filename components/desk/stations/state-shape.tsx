import type { StationState } from '@/lib/contracts/station-overview';

/** Shape of a station's state: ringed dot testing, triangle calls, square with cross waits for the bin, stripes may not test, dashes idle. */
export function StateShape({ state, size = 38 }: { state: StationState; size?: number }) {
  return (
    <svg viewBox="0 0 40 40" width={size} height={size} aria-hidden="true" className="flex-none">
      {shapes[state]}
    </svg>
  );
}

const shapes: Record<StationState, React.ReactNode> = {
  calls: (
    <>
      <path d="M20 2 39 38H1Z" fill="var(--sw-on-attn)" />
      <path d="M20 15v12M20 30v4" stroke="var(--sw-attn)" strokeWidth={4} />
    </>
  ),
  'may-not-test': (
    <>
      <rect x={1} y={1} width={38} height={38} fill="var(--sw-attn)" stroke="var(--sw-on-attn)" strokeWidth={2} />
      <path
        d="M2 22 22 2H12L2 12ZM2 38 38 2h-6L2 32ZM18 38 38 18v-8L10 38ZM34 38l4-4v-8L26 38Z"
        fill="var(--sw-on-attn)"
      />
    </>
  ),
  'waits-for-bin': (
    <>
      <rect x={1} y={1} width={38} height={38} fill="var(--sw-reject)" />
      <path d="M10 10 30 30M30 10 10 30" stroke="var(--sw-on-reject)" strokeWidth={6} />
    </>
  ),
  testing: (
    <>
      <circle cx={20} cy={20} r={15.5} fill="none" stroke="var(--sw-ink)" strokeWidth={7} />
      <circle cx={20} cy={20} r={5} fill="var(--sw-ink)" />
    </>
  ),
  idle: <path d="M2 27h10M15 27h10M28 27h10" stroke="var(--sw-rule)" strokeWidth={6} />,
};

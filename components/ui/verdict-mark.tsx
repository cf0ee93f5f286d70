export type VerdictShape = 'pass' | 'reject' | 'check' | 'hold';

interface VerdictMarkProps {
  shape: VerdictShape;
  /** CSS length or pixels. */
  size?: number | string;
  /** Read aloud; leave out where the word stands beside it. */
  label?: string;
}

/** Word, shape and colour go together: a disc with tick, a square with cross, a triangle, a striped block. */
export function VerdictMark({ shape, size = 19, label }: VerdictMarkProps) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 24 24"
      role={label ? 'img' : undefined}
      aria-label={label}
      aria-hidden={label ? undefined : true}
      className="inline-block flex-none align-[-0.18em]"
    >
      {shapes[shape]}
    </svg>
  );
}

const shapes = {
  pass: (
    <>
      <circle cx={12} cy={12} r={12} fill="var(--sw-pass)" />
      <path d="M6 12.4 10.4 17 18 7.6" fill="none" stroke="var(--sw-on-pass)" strokeWidth={3.2} />
    </>
  ),
  reject: (
    <>
      <rect width={24} height={24} fill="var(--sw-reject)" />
      <path d="M6.5 6.5 17.5 17.5M17.5 6.5 6.5 17.5" stroke="var(--sw-on-reject)" strokeWidth={3.6} />
    </>
  ),
  check: (
    <>
      <path d="M12 1 24 23H0Z" fill="var(--sw-ink)" />
      <path d="M12 8.6v7.2M12 17.8v2.6" stroke="var(--sw-attn)" strokeWidth={2.6} />
    </>
  ),
  hold: (
    <>
      <rect y={3} width={24} height={18} fill="var(--sw-attn)" />
      <path d="M0 11V21H2L12 3H4ZM9 21h7L24 7V3h-5Z" fill="var(--sw-on-attn)" />
    </>
  ),
};

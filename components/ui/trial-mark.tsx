/** A flask in a dashed square: an engineering run. The words stand beside it. */
export function TrialMark({ size = 19 }: { size?: number | string }) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 24 24"
      aria-hidden="true"
      className="inline-block flex-none align-[-0.18em]"
    >
      <rect
        x={1}
        y={1}
        width={22}
        height={22}
        fill="none"
        stroke="currentColor"
        strokeWidth={2}
        strokeDasharray="4 3"
      />
      <path d="M9 5h6M10.5 5v5L6.5 18.5h11L13.5 10V5" fill="none" stroke="currentColor" strokeWidth={2.2} />
      <path d="M8.6 14.5h6.8l1.9 4H6.7Z" fill="currentColor" />
    </svg>
  );
}

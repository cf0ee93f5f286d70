/** ▼ for the trip point, ▲ for the release point, drawn since the fonts lack the sign. Takes the text's size. */
export function PointMark({ point }: { point: 'trip' | 'release' }) {
  const falling = point === 'trip';
  return (
    <svg
      viewBox="0 0 20 16"
      aria-hidden="true"
      className="inline-block h-[0.72em] w-[0.9em] flex-none"
      fill={falling ? 'var(--sw-trip)' : 'var(--sw-release)'}
    >
      <path d={falling ? 'M0 0H20L10 16Z' : 'M0 16H20L10 0Z'} />
    </svg>
  );
}

/** The mark: two thresholds that interlock. Decorative unless `title` names it. `size` is a CSS length or pixels. */
export function Mark({ size = 30, title }: { size?: number | string; title?: string }) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 48 48"
      role={title ? 'img' : undefined}
      aria-label={title}
      aria-hidden={title ? undefined : true}
      style={{ flex: 'none' }}
    >
      <g fill="none" stroke="currentColor" strokeWidth={6}>
        <path d="M2 40H33V15" />
        <path d="M46 8H15V33" />
      </g>
    </svg>
  );
}

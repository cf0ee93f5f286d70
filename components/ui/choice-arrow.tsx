/** The blue arrow at the right of a list field; its parent is `relative`. */
export function ChoiceArrow() {
  return (
    <svg
      viewBox="0 0 10 8"
      aria-hidden="true"
      className="pointer-events-none absolute top-1/2 right-2 h-[7px] w-[9px] -translate-y-1/2 fill-accent"
    >
      <path d="M0 0H10L5 8Z" />
    </svg>
  );
}

/** A bare tick in the text's colour and size. */
export function Tick() {
  return (
    <svg viewBox="0 0 20 16" aria-hidden="true" className="inline-block h-[0.62em] w-[0.78em] flex-none">
      <path d="M1.5 8.5 7 14 18.5 1.5" fill="none" stroke="currentColor" strokeWidth={3} />
    </svg>
  );
}

/** Thick is elapsed, thin is left, the jaw is the due date; a red bar past the jaw has ended. Times in milliseconds. */
export function TimeBar({ from, until, now }: { from: number; until: number; now: number }) {
  const share = Math.min(1, Math.max(0, (now - from) / (until - from || 1)));
  const ended = now > until;
  const end = 470;
  return (
    <svg viewBox="0 0 490 26" aria-hidden="true" className="block h-auto w-full">
      <path d={`M1 0V22H${end}`} fill="none" stroke="var(--sw-rule)" strokeWidth={2} />
      {ended ? (
        <rect x={end - 16} y={5} width={17} height={16} fill="var(--sw-reject)" />
      ) : (
        <>
          <rect y={10} width={share * end} height={11} fill="var(--sw-ink-2)" />
          <path d={`M${Math.max(2, share * end)} 1V22`} stroke="var(--sw-ink)" strokeWidth={5} />
        </>
      )}
      <path d={`M${end} 0V22H${end + 14}Z`} fill="var(--sw-ink)" />
    </svg>
  );
}

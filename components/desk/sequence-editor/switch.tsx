interface SwitchProps {
  id?: string;
  /** Read aloud. */
  label: string;
  on: boolean;
  onChange: (on: boolean) => void;
}

/** On or off: a slot with its filled half at the right, or its hollow one at the left. */
export function Switch({ id, label, on, onChange }: SwitchProps) {
  return (
    <button
      id={id}
      type="button"
      role="switch"
      aria-checked={on}
      aria-label={label}
      onClick={() => onChange(!on)}
      className="inline-flex min-h-[30px] items-center align-middle gap-1.5 text-cap text-ink-2 max-sm:min-h-[46px]"
    >
      <span aria-hidden="true" className="relative inline-block h-4 w-8 border-2 border-accent bg-sheet">
        <span
          className={`absolute inset-y-0.5 w-3 ${on ? 'right-0.5 bg-accent' : 'left-0.5 border-2 border-accent'}`}
        />
      </span>
    </button>
  );
}

interface SelectBoxProps {
  /** Read aloud. */
  label: string;
  checked: boolean;
  /** Some of what it stands for is chosen. */
  mixed?: boolean;
  onChange: (on: boolean) => void;
}

/** A square that chooses a row; its label around it makes room for a finger. */
export function SelectBox({ label, checked, mixed = false, onChange }: SelectBoxProps) {
  return (
    <label className="-my-1 inline-flex min-h-8 min-w-8 items-center max-sm:min-h-[46px]">
      <input
        type="checkbox"
        aria-label={label}
        checked={checked}
        ref={(input) => {
          if (input) input.indeterminate = mixed;
        }}
        onChange={(event) => onChange(event.target.checked)}
        className="size-5 flex-none appearance-none border-2 border-accent bg-sheet checked:bg-accent checked:shadow-[inset_0_0_0_4px_var(--sw-sheet)] indeterminate:bg-[linear-gradient(var(--sw-accent),var(--sw-accent))] indeterminate:bg-[length:8px_2px] indeterminate:bg-center indeterminate:bg-no-repeat"
      />
    </label>
  );
}

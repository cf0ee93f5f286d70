import { useId, type ComponentProps } from 'react';

type CheckFieldProps = Omit<ComponentProps<'input'>, 'id' | 'type'> & { label: string; hint?: string };

/** Yes or no: a square that fills. */
export function CheckField({ label, hint, ...input }: CheckFieldProps) {
  const id = useId();
  return (
    <div className="flex min-h-9 items-center gap-2.5 max-sm:min-h-[46px]">
      <input
        {...input}
        id={id}
        type="checkbox"
        aria-describedby={hint ? `${id}-hint` : undefined}
        className="size-5 flex-none appearance-none border-2 border-accent bg-sheet checked:shadow-[inset_0_0_0_4px_var(--sw-sheet)] checked:bg-accent"
      />
      <label htmlFor={id}>{label}</label>
      {hint ? (
        <span id={`${id}-hint`} className="text-cap text-ink-2">
          {hint}
        </span>
      ) : null}
    </div>
  );
}

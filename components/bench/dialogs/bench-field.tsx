import { useId, type ComponentProps } from 'react';
import { VerdictMark } from '../../ui/verdict-mark';

type BenchFieldProps = Omit<ComponentProps<'input'>, 'id'> & { label: string; error?: string | null };

/** A field for a finger: 100 px high, in Mono. Pasting is refused where two entries are compared. */
export function BenchField({ label, error, ...input }: BenchFieldProps) {
  const id = useId();
  return (
    <div className="grid gap-2">
      <label htmlFor={id} className="text-b-label">
        {label}
      </label>
      <input
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        {...input}
        id={id}
        aria-invalid={error ? true : undefined}
        aria-describedby={error ? `${id}-message` : undefined}
        className={`font-num min-h-(--sw-bench-button) w-full bg-paper px-5 text-b-flag font-bold ${error ? 'border-4 border-reject' : 'border-2 border-b-4 border-rule'}`}
      />
      {error && (
        <p id={`${id}-message`} role="alert" className="flex items-center gap-3 text-b-label font-bold text-reject">
          <VerdictMark shape="reject" size="0.9em" />
          {error}
        </p>
      )}
    </div>
  );
}

import type { BoardTypeChange } from '@/lib/board-type/compare-board-types';

export function ChangeList({ changes }: { changes: readonly BoardTypeChange[] }) {
  return (
    <ul className="grid gap-0.5">
      {changes.map(({ label, before, after }) => (
        <li key={label}>
          {label}: <b>{after}</b>, was {before}
        </li>
      ))}
    </ul>
  );
}

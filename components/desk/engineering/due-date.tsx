import { VerdictMark } from '@/components/ui/verdict-mark';
import { Time } from '../time';

const dayMs = 24 * 3_600_000;

/** A due day with how long it is off; amber in the last 30 days, red past it. `today` and `dueOn` as year-month-day. */
export function DueDate({ dueOn, today }: { dueOn: string | null; today: string }) {
  if (!dueOn)
    return (
      <span className="inline-flex items-center gap-2 font-bold text-reject">
        <VerdictMark shape="reject" size={14} /> no certificate
      </span>
    );
  const days = Math.round((Date.parse(dueOn) - Date.parse(today)) / dayMs);
  const shown = <Time iso={`${dueOn}T12:00:00Z`} format="day" />;
  if (days < 0)
    return (
      <span className="inline-flex items-center gap-2 font-bold text-reject">
        <VerdictMark shape="reject" size={14} /> {shown}, ended
      </span>
    );
  return (
    <span className="inline-flex items-center gap-2">
      {days <= 30 ? <VerdictMark shape="check" size={15} /> : null}
      <b>{shown}</b>
      <span className="text-ink-2">{days === 0 ? 'today' : days === 1 ? 'tomorrow' : `in ${days} days`}</span>
    </span>
  );
}

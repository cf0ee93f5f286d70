import { VerdictMark } from '@/components/ui/verdict-mark';
import type { LotState } from '@/lib/contracts/stored-states';
import { lotStateWords } from '../words';

/** A lot's state in words; a hold comes first, with its stripes. */
export function LotStateMark({ state, held }: { state: LotState; held: boolean }) {
  if (!held) return <span>{lotStateWords[state]}</span>;
  return (
    <span className="inline-flex items-center gap-1.5">
      <VerdictMark shape="hold" size={16} />
      On hold{state === 'open' ? '' : `, ${lotStateWords[state].toLowerCase()}`}
    </span>
  );
}

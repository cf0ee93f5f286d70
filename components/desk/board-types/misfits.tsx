import Link from 'next/link';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { SequenceMisfit } from '@/lib/contracts/board-type-revision';

/** Sequences in use that no longer fit: lots made with the new limits would be refused by the stations. */
export function Misfits({ misfits }: { misfits: readonly SequenceMisfit[] }) {
  if (misfits.length === 0) return null;
  return (
    <div className="grid gap-1.5 border-l-[10px] border-attn bg-attn-wash px-3 py-2">
      <p className="flex items-start gap-2 font-bold">
        <VerdictMark shape="check" size={16} />
        <span>
          {misfits.length === 1 ? 'A sequence in use does' : `${misfits.length} sequences in use do`} not fit these
          limits. Release a new revision of it before the next lot.
        </span>
      </p>
      {misfits.map(({ sequenceId, name, revision, sentences }) => (
        <div key={sequenceId}>
          <Link className="sw-link font-bold" href={`/sequences/${sequenceId}`}>
            {name} {revision}
          </Link>
          <ul className="list-disc pl-5">
            {sentences.map((sentence) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        </div>
      ))}
    </div>
  );
}

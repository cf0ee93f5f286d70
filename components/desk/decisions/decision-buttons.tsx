import { dispositionKinds, type DispositionKind } from '@/lib/contracts/stored-states';

const shortWords: Record<DispositionKind, string> = {
  rework: 'Rework',
  scrap: 'Scrap',
  concession: 'Use as is',
  return: 'Return',
};

interface DecisionButtonsProps {
  /** What may be decided. */
  kinds: readonly DispositionKind[];
  /** Read aloud after each word, such as "board 00122". */
  of: string;
  onChoose: (kind: DispositionKind) => void;
}

/** One button a decision, joined in one frame. */
export function DecisionButtons({ kinds, of, onChoose }: DecisionButtonsProps) {
  const shown = dispositionKinds.filter((kind) => kinds.includes(kind));
  if (shown.length === 0) return null;
  return (
    <span className="inline-flex border-2 border-accent" role="group" aria-label={`Decide ${of}`}>
      {shown.map((kind) => (
        <button
          key={kind}
          type="button"
          aria-label={`${shortWords[kind]}, ${of}`}
          className="min-h-[26px] border-l border-accent px-2.5 font-bold whitespace-nowrap text-accent max-sm:px-2 first:border-l-0 hover:bg-accent hover:text-on-accent max-sm:min-h-[44px]"
          onClick={() => onChoose(kind)}
        >
          {shortWords[kind]}
        </button>
      ))}
    </span>
  );
}

import type { ReactNode } from 'react';
import { useBench } from './bench-context';
import { LotFoot } from './lot-foot';
import { TrialFoot } from './trial-foot';
import { RefusalBand } from './refusal-band';
import { WatcherNote } from './watcher-note';

interface BenchFooterProps {
  /** Instead of the lot rule. */
  note?: ReactNode;
  /** Last words of the lot sentence, such as "waiting for the bin scan". */
  ending?: ReactNode;
  actions?: ReactNode;
}

/** The foot of every screen: the lot at the left, what a hand can do at the right. A watching screen has no actions. */
export function BenchFooter({ note, ending, actions }: BenchFooterProps) {
  const { view, leads, refusal } = useBench();
  return (
    <footer className="relative flex flex-none items-center justify-between gap-12 border-t-4 border-ink px-12 py-5.5 max-[900px]:flex-col max-[900px]:items-stretch max-[900px]:gap-4">
      {refusal && <RefusalBand refusal={refusal} serial={refusal.serial} />}
      <div className="min-w-0 flex-1 max-[900px]:flex-none">
        {note ? (
          <p className="text-b-line text-ink-2">{note}</p>
        ) : view.engineering ? (
          <TrialFoot trial={view.engineering} />
        ) : (
          view.lot && <LotFoot lot={view.lot} ending={ending} />
        )}
      </div>
      {!leads && <WatcherNote />}
      {leads && actions ? (
        <div className="flex flex-none gap-(--sw-bench-gap) max-[900px]:[&>*]:flex-1">{actions}</div>
      ) : null}
    </footer>
  );
}

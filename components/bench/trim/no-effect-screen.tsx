import { useTranslations } from 'next-intl';
import { TrimmerPicture } from '@/components/ui/trimmer-picture';
import type { TrimmerPhoto } from '@/lib/contracts/board-type';
import type { TrimView } from '@/lib/trim/types';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { CallButton } from '../call-button';
import { FindingBand } from '../finding-band';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { StopButton } from '../stop-button';
import { BoardPicture } from './board-picture';
import { heldReading, trimInside } from './trim-inside';

/** Turning changed nothing: the wrong screw, or a trimmer that will not work. The operator says which. */
export function NoEffectScreen({ trim, photo }: { trim: TrimView; photo?: TrimmerPhoto }) {
  const t = useTranslations('bench.noEffect');
  const { send, leads } = useBench();
  return (
    <>
      <Panes
        left={<RailsPane showsTarget inside={{ ...trimInside(trim), shiftVolts: null }} fixed={heldReading(trim)} />}
      >
        <FindingBand finding="no-effect" trim={trim} />
        <div className="flex min-h-0 flex-1 flex-col justify-between gap-5 px-12 py-6">
          <div className="flex min-h-0 items-center gap-14 max-[900px]:flex-col">
            <div className="w-160 max-w-full">
              {photo ? (
                <TrimmerPicture
                  photo={photo}
                  label={t('screw')}
                  className="max-h-[calc(420*var(--sw-b))]"
                  otherwise={<BoardPicture label={t('screw')} />}
                />
              ) : (
                <BoardPicture label={t('screw')} />
              )}
            </div>
            <p className="text-[calc(44*var(--sw-b))] leading-[1.28]">{t('look')}</p>
          </div>
          {leads && (
            <div className="grid grid-cols-2 gap-(--sw-bench-gap) max-[900px]:grid-cols-1">
              <Choice title={t('willNotTurn')} text={t('stuck')} onPress={() => send({ kind: 'will-not-turn' })} />
              <Choice filled title={t('found')} text={t('again')} onPress={() => send({ kind: 'screw-found' })} />
            </div>
          )}
        </div>
      </Panes>
      <BenchFooter
        ending={t('waiting')}
        actions={
          <>
            <CallButton />
            <StopButton endTest />
          </>
        }
      />
    </>
  );
}

interface ChoiceProps {
  title: string;
  text: string;
  filled?: boolean;
  onPress: () => void;
}

/** A large choice: what it is, and what follows. */
function Choice({ title, text, filled = false, onPress }: ChoiceProps) {
  return (
    <button
      type="button"
      data-filled={filled ? '' : undefined}
      onClick={onPress}
      className={`grid min-h-46 content-center gap-2 border-4 border-accent px-8 py-4 text-start ${filled ? 'bg-accent text-on-accent hover:bg-accent-deep' : 'bg-sheet text-accent hover:bg-accent-wash'}`}
    >
      <b className="text-[calc(54*var(--sw-b))] leading-none">{title}</b>
      <span className={`text-b-label leading-snug ${filled ? '' : 'text-ink'}`}>{text}</span>
    </button>
  );
}

import { useTranslations } from 'next-intl';
import type { SupplyView } from '@/lib/contracts/bench-view';
import { Button } from '../../ui/button';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { Cautions } from '../cautions';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { StopButton } from '../stop-button';
import { SupplyGauge } from '../supply-gauge';

interface InstructionScreenProps {
  screen: { text: string; pictureId: string | null; supplyOff: boolean };
  supply: SupplyView;
}

/** Something only a person can do, in the engineer's words. "You may open the lid" is said only after read-back below 2 V. */
export function InstructionScreen({ screen, supply }: InstructionScreenProps) {
  const t = useTranslations('bench.instruction');
  const words = useTranslations('bench.noVerdict');
  const { send } = useBench();
  const { text, pictureId, supplyOff } = screen;
  const mayOpen = supplyOff && supply.state === 'off' && supply.volts < 2;
  return (
    <>
      <Panes left={<RailsPane />}>
        <div className="flex h-full min-h-0 items-stretch gap-12 px-16 py-6 pr-12 max-[900px]:flex-col">
          <div className="flex min-w-0 flex-1 flex-col justify-center gap-6">
            <h1 className={`leading-[1.14] font-bold text-accent ${sizeFor(text)}`}>{text}</h1>
            <p role="status" className="text-[calc(40*var(--sw-b))] leading-[1.25] font-bold">
              {mayOpen
                ? t('mayOpen')
                : !supplyOff
                  ? t('keepClosed')
                  : supply.state === 'maybe-on'
                    ? words('supplyMaybeOn')
                    : t('notYet')}
            </p>
            <Cautions which={mayOpen ? ['esd', 'site-rules'] : ['supply-off', 'eyes', 'site-rules']} />
          </div>
          <div
            className={`flex min-h-0 flex-none flex-col justify-center gap-8 max-[900px]:w-full ${pictureId ? 'w-110' : 'w-80'}`}
          >
            {pictureId && (
              // The picture is the person's to read; the words beside it say the same.
              // eslint-disable-next-line @next/next/no-img-element -- served by its id, of any size
              <img
                src={`/api/files/${pictureId}`}
                alt={t('picture')}
                className="max-h-100 w-full min-h-0 border-2 border-ink bg-sheet object-contain"
              />
            )}
            <SupplyGauge supply={supply} />
          </div>
        </div>
      </Panes>
      <BenchFooter
        actions={
          <>
            <StopButton />
            {(mayOpen || !supplyOff) && (
              <Button size="bench" kind="filled" onClick={() => send({ kind: 'confirm', what: 'instruction-done' })}>
                {t('done')}
              </Button>
            )}
          </>
        }
      />
    </>
  );
}

/** Large for a few words; 160 characters still fit beside a picture. */
function sizeFor({ length }: string): string {
  if (length <= 40) return 'text-[calc(84*var(--sw-b))]';
  return length <= 90 ? 'text-[calc(60*var(--sw-b))]' : 'text-[calc(44*var(--sw-b))]';
}

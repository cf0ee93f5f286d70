import { useTranslations } from 'next-intl';
import { useState } from 'react';
import { Button } from '../../ui/button';
import { BenchFooter } from '../bench-footer';
import { useBench } from '../bench-context';
import { Cautions } from '../cautions';
import { BadgeByHandDialog } from '../dialogs/badge-by-hand-dialog';
import { Fitted } from '../fitted';
import { Panes } from '../panes';
import { BarsPicture, ScanFrame } from '../scan-frame';
import { StationPanel } from '../station-panel';

/** A shift starts here. */
export function BadgeScreen() {
  const t = useTranslations('bench.badge');
  const { view } = useBench();
  const [byHand, setByHand] = useState(false);
  const ready = view.readiness.every((item) => item.state !== 'bad');
  return (
    <>
      <Panes left={<StationPanel />}>
        <div className="flex h-full flex-col justify-between gap-6 px-16 pt-14 pb-7 pr-12">
          <Fitted as="h1" text={t('title')} most={150} width={1140} className="text-accent" />
          <ScanFrame>
            <rect
              x={362}
              y={32}
              width={416}
              height={140}
              fill="var(--sw-sheet)"
              stroke="var(--sw-ink)"
              strokeWidth={4}
            />
            <rect x={548} y={42} width={44} height={9} fill="var(--sw-ink)" />
            <g fill="var(--sw-ink-2)">
              <rect
                x={386}
                y={68}
                width={86}
                height={88}
                fill="var(--sw-well)"
                stroke="var(--sw-ink-2)"
                strokeWidth={3}
              />
              <path d="M414 84h30v30h-30zM402 154v-16l16-16h22l16 16v16z" />
            </g>
            <BarsPicture x={500} y={68} width={254} height={88} />
          </ScanFrame>
          <div>
            <p className="text-[calc(44*var(--sw-b))] leading-[1.3]">{t('thenPin')}</p>
            <p className="text-[calc(44*var(--sw-b))] leading-[1.3]">{t(ready ? 'ready' : 'notReady')}</p>
            <Cautions which={['supply-off', 'esd', 'site-rules']} className="mt-4" />
          </div>
        </div>
      </Panes>
      <BenchFooter
        note={t('note')}
        actions={
          <Button size="bench" onClick={() => setByHand(true)}>
            {t('noBadge')}
          </Button>
        }
      />
      <BadgeByHandDialog open={byHand} onOpenChange={setByHand} />
    </>
  );
}

import { useTranslations } from 'next-intl';
import type { ReactNode } from 'react';
import { Button } from '../../ui/button';
import { VerdictMark } from '../../ui/verdict-mark';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { Fitted } from '../fitted';
import { LabelNote } from '../label-note';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { TrialActions } from '../trial-actions';
import { useNumbers } from '../use-numbers';

/** Pass is green on paper. Scanning the next board starts it. */
export function PassScreen({ seconds }: { seconds: number }) {
  const t = useTranslations('bench.pass');
  const idle = useTranslations('bench.idle');
  const { send, view } = useBench();
  const { whole } = useNumbers();
  const bold = (chunks: ReactNode) => <b className="font-num text-ink">{chunks}</b>;
  return (
    <>
      <Panes left={<RailsPane />}>
        <div className="absolute inset-y-0 right-0 w-7 bg-pass" />
        <div className="flex h-full items-center gap-13 pr-14 pl-14 max-[900px]:flex-col max-[900px]:items-start">
          <div className="flex-none">
            <VerdictMark shape="pass" size="calc(388 * var(--sw-b))" />
          </div>
          <div className="min-w-0">
            <Fitted as="h1" text={t('title')} most={264} width={690} className="!font-extrabold text-pass" />
            <p className="mt-10 text-b-next leading-[1.16] font-bold whitespace-pre-line">{t('next')}</p>
            <div className="mt-5 text-b-line text-ink-2">
              {view.engineering ? <p>{t('noLabel')}</p> : <LabelNote />}
            </div>
          </div>
        </div>
      </Panes>
      <BenchFooter
        ending={t.rich('thisOne', { seconds: whole(seconds), b: bold })}
        actions={
          view.engineering ? (
            <TrialActions />
          ) : (
            <>
              <Button size="bench" onClick={() => send({ kind: 'end-shift' })}>
                {idle('endShift')}
              </Button>
              <Button size="bench" onClick={() => send({ kind: 'print-label-again' })}>
                {t('printAgain')}
              </Button>
            </>
          )
        }
      />
    </>
  );
}

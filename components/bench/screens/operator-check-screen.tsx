import { useTranslations } from 'next-intl';
import { Button } from '../../ui/button';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { Panes } from '../panes';
import { RailsPane } from '../rails-pane';
import { StopButton } from '../stop-button';
import { PlainScreen } from './plain-screen';

/** A question that only a person can answer. No answer is the obvious one, so that Enter decides nothing. */
export function OperatorCheckScreen({ question }: { question: string }) {
  const t = useTranslations('bench.operatorCheck');
  const { send } = useBench();
  return (
    <>
      <Panes left={<RailsPane />}>
        <PlainScreen title={question}>
          <p>{t('text')}</p>
        </PlainScreen>
      </Panes>
      <BenchFooter
        actions={
          <>
            <StopButton />
            <Button size="bench" onClick={() => send({ kind: 'answer', ok: false })}>
              {t('no')}
            </Button>
            <Button size="bench" onClick={() => send({ kind: 'answer', ok: true })}>
              {t('yes')}
            </Button>
          </>
        }
      />
    </>
  );
}

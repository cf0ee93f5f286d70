import { useTranslations } from 'next-intl';
import { Button } from '../../ui/button';
import { useBench } from '../bench-context';
import { StopButton } from '../stop-button';

/** What a hand can press during a trim. Where beeps say "Stop" the abort reads "End test". */
export function TrimActions({ endTest }: { endTest: boolean }) {
  const t = useTranslations('bench.trim');
  const { send } = useBench();
  return (
    <>
      <Button size="bench" onClick={() => send({ kind: 'will-not-turn' })}>
        {t('willNotTurn')}
      </Button>
      <StopButton endTest={endTest} />
    </>
  );
}

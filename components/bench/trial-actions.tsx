import { useTranslations } from 'next-intl';
import { Button } from '../ui/button';
import { useBench } from './bench-context';

/** The ways out of a trial: back to production with the offer left open, or done with it. */
export function TrialActions() {
  const t = useTranslations('bench.engineering');
  const { send } = useBench();
  return (
    <>
      <Button size="bench" onClick={() => send({ kind: 'end-trial' })}>
        {t('end')}
      </Button>
      <Button size="bench" onClick={() => send({ kind: 'leave-trial' })}>
        {t('leave')}
      </Button>
    </>
  );
}

import { useTranslations } from 'next-intl';
import { Button } from '../ui/button';
import { useBench } from './bench-context';

/** Ends the run at once, as Escape does. `endTest` names it so where "Stop" means the screw. */
export function StopButton({ endTest = false }: { endTest?: boolean }) {
  const t = useTranslations('bench.stop');
  const { send } = useBench();
  return (
    <Button size="bench" kind="stop" onClick={() => send({ kind: 'stop' })}>
      {t(endTest ? 'endTest' : 'stop')}
    </Button>
  );
}

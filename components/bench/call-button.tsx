import { useTranslations } from 'next-intl';
import { Button } from '../ui/button';
import { useBench } from './bench-context';
import { useNumbers } from './use-numbers';

/** Calls an engineer; once called it says since when, or who comes. */
export function CallButton({ kind = 'outlined' }: { kind?: 'filled' | 'outlined' }) {
  const t = useTranslations('bench.call');
  const { view, send } = useBench();
  const { clock } = useNumbers();
  const { call } = view;
  if (call)
    return (
      <p
        role="status"
        className="flex min-h-(--sw-bench-button) max-w-115 items-center border-4 border-dashed border-ink-3 px-7 text-b-label leading-tight font-bold"
      >
        {call.acknowledgedBy ? t('coming', { name: call.acknowledgedBy }) : t('called', { time: clock(call.sinceIso) })}
      </p>
    );
  return (
    <Button size="bench" kind={kind} onClick={() => send({ kind: 'call-engineer' })}>
      {t('call')}
    </Button>
  );
}

import { useTranslations } from 'next-intl';
import { VerdictMark } from '../ui/verdict-mark';
import { useBench } from './bench-context';

/** Where the newest label is: printing, printed, or why it failed. It never stops the testing. */
export function LabelNote({ onlyProblems = false }: { onlyProblems?: boolean }) {
  const t = useTranslations('bench.label');
  const { label } = useBench().view;
  if (!label) return onlyProblems ? null : <p>{t('none')}</p>;
  if (label.state === 'failed')
    return (
      <p role="status" className="flex items-center gap-3 font-bold text-ink">
        <VerdictMark shape="check" size="0.95em" />
        {t('failed', { problem: label.problem ?? '' })}
      </p>
    );
  return onlyProblems ? null : <p>{t(label.state)}</p>;
}

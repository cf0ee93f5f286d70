import { useTranslations } from 'next-intl';
import { VerdictMark } from '../ui/verdict-mark';
import { useBench } from './bench-context';

const look =
  'flex min-h-(--sw-bench-button) items-end px-4 pb-5 font-bold text-accent underline decoration-2 underline-offset-4 hover:bg-accent-wash';

/** Sound and menu, at the right over the step line. */
export function BenchTools({ onMenu }: { onMenu: () => void }) {
  const t = useTranslations('bench.tools');
  const { sound, toggleSound, leads } = useBench();
  return (
    <div className="absolute right-8 -bottom-12.5 z-10 flex gap-(--sw-bench-gap) text-b-label max-[900px]:static max-[900px]:w-full">
      <button type="button" className={look} onClick={toggleSound} aria-pressed={sound === 'muted'}>
        <span className="flex items-center gap-2.5">
          {sound !== 'on' && <VerdictMark shape="check" size="0.9em" />}
          {t(`sound.${sound}`)}
        </span>
      </button>
      {!leads && (
        <span className={`${look.replace('text-accent underline', 'text-ink')} hover:!bg-transparent`}>
          {t('watching')}
        </span>
      )}
      {leads && (
        <button type="button" className={look} onClick={onMenu} aria-haspopup="dialog">
          {t('menu')}
        </button>
      )}
    </div>
  );
}

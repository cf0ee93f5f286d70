import { useTranslations } from 'next-intl';
import { Mark } from '../ui/mark';
import { buttonClass } from '../ui/button-style';
import { Fitted } from './fitted';

/** Before the first view: a moment's wait, or why this browser is not let in. */
export function ConnectingScreen({ refusedCode, lost }: { refusedCode: string | null; lost: boolean }) {
  const t = useTranslations('bench');
  const refused = refusedCode === 'sign-in' || refusedCode === 'not-allowed' || refusedCode === 'station-unknown';
  const title = refused ? t('unreachable.title') : lost ? t('lost.title') : t('connecting.title');
  return (
    <main className="sw-bench flex min-h-dvh flex-col justify-center gap-12 bg-paper px-24 text-ink">
      <Mark size="calc(110 * var(--sw-b))" title="Sillwright" />
      <Fitted as="h1" text={title} most={110} width={1700} />
      <p role="status" className="text-[calc(44*var(--sw-b))]">
        {refused ? t('unreachable.signIn') : t('connecting.text')}
      </p>
      {refused && (
        <p>
          <a className={buttonClass('filled', 'bench')} href="">
            {t('unreachable.again')}
          </a>
        </p>
      )}
    </main>
  );
}

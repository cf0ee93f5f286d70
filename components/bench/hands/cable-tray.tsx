import { useTranslations } from 'next-intl';
import type { HandsProps } from './hands-drawer';
import styles from './hands.module.css';

const cables = ['supply', 'meter', 'controller'] as const;

/** Cables to pull and to plug in again. */
export function CableTray({ hands, act, hasController }: HandsProps & { hasController: boolean }) {
  const t = useTranslations('hands');
  return (
    <section>
      <h3>{t('cables')}</h3>
      <div className={styles.row}>
        {cables
          .filter((which) => which !== 'controller' || hasController)
          .map((which) => {
            const plugged = hands.cables[which];
            return (
              <button
                key={which}
                type="button"
                className={styles.press}
                aria-pressed={!plugged}
                data-strong={plugged ? undefined : ''}
                onClick={() => act({ kind: 'cable', which, plugged: !plugged })}
              >
                {t(plugged ? 'pull' : 'plug', { cable: t(`cable.${which}`) })}
              </button>
            );
          })}
      </div>
    </section>
  );
}

import { useTranslations } from 'next-intl';
import { defectKinds, type DefectKind } from '@/lib/contracts/bench-command';
import type { HandsProps } from './hands-drawer';
import styles from './hands.module.css';

const bumpsMs = [5, 20, 60, 200] as const;

/** What can go wrong with a board: a defect fitted to it, or a bump of its supply. */
export function DefectTray({ hands, act }: HandsProps) {
  const t = useTranslations('hands');
  return (
    <section>
      <h3>{t('defect')}</h3>
      <select
        aria-label={t('defect')}
        value={hands.defect}
        onChange={(event) => act({ kind: 'defect', defect: event.target.value as DefectKind })}
      >
        {defectKinds.map((kind) => (
          <option key={kind} value={kind}>
            {t(`defects.${kind}`)}
          </option>
        ))}
      </select>
      <h3 style={{ marginTop: 10 }}>{t('bump')}</h3>
      <div className={styles.row}>
        {bumpsMs.map((milliseconds) => (
          <button
            key={milliseconds}
            type="button"
            className={styles.press}
            onClick={() => act({ kind: 'bump-supply', milliseconds })}
          >
            {t('milliseconds', { count: milliseconds })}
          </button>
        ))}
      </div>
    </section>
  );
}

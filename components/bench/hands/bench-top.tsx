import { useTranslations } from 'next-intl';
import { serialGroups } from '@/lib/barcode/serial-groups';
import type { HandsProps } from './hands-drawer';
import styles from './hands.module.css';

const short = (serial: string) => serialGroups(serial).at(-1) ?? serial;

/** Board and lid. */
export function BenchTop({ hands, act }: HandsProps) {
  const t = useTranslations('hands');
  return (
    <section>
      <h3>
        {t('board')}: <b>{hands.boardSerial ? short(hands.boardSerial) : t('none')}</b>
      </h3>
      <div className={styles.row}>
        {hands.boardSerial ? (
          <button type="button" className={styles.press} onClick={() => act({ kind: 'remove-board' })}>
            {t('remove')}
          </button>
        ) : (
          <button
            type="button"
            className={styles.press}
            data-strong=""
            onClick={() => act({ kind: 'place-board', serial: hands.nextSerial ?? undefined })}
          >
            {hands.nextSerial ? t('placeNext', { serial: short(hands.nextSerial) }) : t('place')}
          </button>
        )}
        <button
          type="button"
          className={styles.press}
          aria-pressed={hands.lidClosed}
          onClick={() => act({ kind: 'lid', closed: !hands.lidClosed })}
        >
          {t(hands.lidClosed ? 'open' : 'close')}
        </button>
      </div>
    </section>
  );
}

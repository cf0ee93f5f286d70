import { useTranslations } from 'next-intl';
import { useState } from 'react';
import { printCode } from '@/lib/bench/scan-code';
import { serialGroups } from '@/lib/barcode/serial-groups';
import type { BenchView } from '@/lib/contracts/bench-view';
import type { HandsProps } from './hands-drawer';
import styles from './hands.module.css';

interface ScanTrayProps extends HandsProps {
  view: BenchView;
  scan: (text: string) => void;
}

/** A scanner for those who have none: the label of the next board, of the bin that waits, or any text. */
export function ScanTray({ hands, view, scan, act }: ScanTrayProps) {
  const t = useTranslations('hands');
  const [text, setText] = useState('');
  const bin = view.screen.kind === 'bin' ? view.screen.binCode : null;
  const board = hands.boardSerial ?? hands.nextSerial;
  return (
    <section>
      <h3>{t('scanner')}</h3>
      <div className={styles.row}>
        {bin !== null ? (
          <button type="button" className={styles.press} data-strong="" onClick={() => scan(printCode('bin', bin))}>
            {t('scanBin', { bin })}
          </button>
        ) : (
          board && (
            <button type="button" className={styles.press} data-strong="" onClick={() => scan(board)}>
              {t('scanNext', { serial: serialGroups(board).at(-1)! })}
            </button>
          )
        )}
      </div>
      <form
        className={styles.row}
        style={{ marginTop: 8 }}
        onSubmit={(event) => {
          event.preventDefault();
          scan(text.trim());
          setText('');
        }}
      >
        <input
          aria-label={t('anyCode')}
          placeholder={t('anyCode')}
          value={text}
          onChange={(e) => setText(e.target.value)}
        />
        <button type="submit" className={styles.press}>
          {t('scan')}
        </button>
        {text.trim().length >= 3 && (
          <button
            type="button"
            className={styles.press}
            onClick={() => act({ kind: 'place-board', serial: text.trim().toUpperCase() })}
          >
            {t('placeIt')}
          </button>
        )}
      </form>
    </section>
  );
}

import { useTranslations } from 'next-intl';
import { useState } from 'react';
import type { CommandReply, HandsCommand, HandsView } from '@/lib/contracts/bench-command';
import type { BenchView } from '@/lib/contracts/bench-view';
import { useSay } from '../use-say';
import { BenchTop } from './bench-top';
import { CableTray } from './cable-tray';
import { DefectTray } from './defect-tray';
import styles from './hands.module.css';
import { ScanTray } from './scan-tray';
import { ScrewTray } from './screw-tray';

export interface HandsProps {
  hands: HandsView;
  act: (command: HandsCommand) => void;
}

interface HandsDrawerProps {
  hands: HandsView;
  view: BenchView;
  send: (command: HandsCommand) => Promise<CommandReply>;
  /** What a scanner would have read. */
  scan: (text: string) => void;
}

/**
 * Simulated hands, beside the screen of a simulated station. The bench shrinks to make room, so that the tray covers none of
 * its actions.
 */
export function HandsDrawer({ hands, view, send, scan }: HandsDrawerProps) {
  const t = useTranslations('hands');
  const say = useSay();
  const [open, setOpen] = useState(true);
  const [problem, setProblem] = useState<CommandReply>({ ok: true });
  const act = (command: HandsCommand) => void send(command).then(setProblem);
  if (!open)
    return (
      <button type="button" className={styles.tab} aria-expanded={false} onClick={() => setOpen(true)}>
        {t('show')}
      </button>
    );
  return (
    <aside className={styles.tray} aria-label={t('title')}>
      <div className={styles.row} style={{ justifyContent: 'space-between' }}>
        <h2>{t('title')}</h2>
        <button type="button" className={styles.press} aria-expanded onClick={() => setOpen(false)}>
          {t('hide')}
        </button>
      </div>
      <p>{t('lead')}</p>
      {!problem.ok && <p role="alert">{say(problem)}</p>}
      <BenchTop hands={hands} act={act} />
      <ScanTray hands={hands} view={view} scan={scan} act={act} />
      <ScrewTray hands={hands} act={act} />
      <DefectTray hands={hands} act={act} />
      <CableTray hands={hands} act={act} hasController={view.station.hasController} />
    </aside>
  );
}

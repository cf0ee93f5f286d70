import { useTranslations } from 'next-intl';
import { useEffect, useRef, type KeyboardEvent, type PointerEvent } from 'react';
import type { HandsProps } from './hands-drawer';
import styles from './hands.module.css';
import { turnsBetween, turnsOfKey, turnsOfWheel } from './screw-turning';
import { useTurning } from './use-turning';

/** The trimmer's screw through the hole in the lid: drag around it, roll the wheel, or use the keys. */
export function ScrewTray({ hands, act }: HandsProps) {
  const t = useTranslations('hands');
  const knob = useRef<SVGSVGElement>(null);
  const angle = useRef<number | null>(null);
  const turn = useTurning((turns) => act({ kind: 'turn', turns }));
  const onWheel = useRef(turn);
  useEffect(() => {
    onWheel.current = turn;
  });
  useEffect(() => {
    const element = knob.current;
    // React listens to wheels passively; this one must keep the tray from scrolling.
    const roll = (event: WheelEvent) => {
      event.preventDefault();
      onWheel.current(turnsOfWheel(event.deltaY));
    };
    element?.addEventListener('wheel', roll, { passive: false });
    return () => element?.removeEventListener('wheel', roll);
  }, []);
  const angleOf = (event: PointerEvent<SVGSVGElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    return Math.atan2(event.clientY - box.top - box.height / 2, event.clientX - box.left - box.width / 2);
  };
  const onKey = (event: KeyboardEvent) => {
    const turns = turnsOfKey(event.key);
    if (turns === null) return;
    event.preventDefault();
    turn(turns);
  };
  return (
    <section>
      <h3>{t('screw')}</h3>
      <div className={styles.row}>
        <svg
          ref={knob}
          viewBox="-66 -66 132 132"
          className={styles.knob}
          role="slider"
          tabIndex={0}
          aria-label={t('screw')}
          aria-valuemin={0}
          aria-valuemax={hands.travelTurns}
          aria-valuenow={Number(hands.screwTurns.toFixed(2))}
          aria-valuetext={t('position', { turns: hands.screwTurns, travel: hands.travelTurns })}
          onKeyDown={onKey}
          onPointerDown={(event) => {
            event.currentTarget.setPointerCapture(event.pointerId);
            angle.current = angleOf(event);
          }}
          onPointerMove={(event) => {
            if (angle.current === null) return;
            const now = angleOf(event);
            turn(turnsBetween(angle.current, now));
            angle.current = now;
          }}
          onPointerUp={() => {
            angle.current = null;
          }}
          onPointerCancel={() => {
            angle.current = null;
          }}
        >
          <circle r={62} fill="#c9a23f" stroke="#5a3d12" strokeWidth={4} />
          <circle r={48} fill="#e2c163" stroke="#a07c46" strokeWidth={2} strokeDasharray="4 5" />
          <rect
            x={-6}
            y={-46}
            width={12}
            height={92}
            rx={5}
            fill="#5a3d12"
            transform={`rotate(${((hands.screwTurns % 1) * 360).toFixed(1)})`}
          />
        </svg>
        <div style={{ flex: 1, minWidth: 120 }}>
          <p>{t('position', { turns: hands.screwTurns, travel: hands.travelTurns })}</p>
          <button
            type="button"
            className={styles.press}
            data-strong=""
            style={{ marginTop: 8 }}
            onClick={() => act({ kind: 'turn-as-prompted' })}
          >
            {t('asPrompted')}
          </button>
        </div>
      </div>
      <p style={{ fontSize: 13, marginTop: 6 }}>{t('screwHelp')}</p>
    </section>
  );
}

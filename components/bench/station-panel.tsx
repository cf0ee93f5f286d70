import { useTranslations } from 'next-intl';
import type { ReadinessItem } from '@/lib/contracts/bench-view';
import { VerdictMark } from '../ui/verdict-mark';
import { useBench } from './bench-context';
import { TimeBar } from './time-bar';
import { useSay } from './use-say';
import { useNow } from './use-now';
import { useNumbers } from './use-numbers';

const shapes = { good: 'pass', soon: 'check', bad: 'reject' } as const;

/** What must be in order before a station may test, with its dates. What is wrong stands first. */
export function StationPanel() {
  const { view } = useBench();
  const items = [...view.readiness]
    .filter((item) => item.state !== 'good' || (item.key !== 'links' && item.key !== 'database'))
    .sort((a, b) => rank(a) - rank(b))
    .slice(0, 5);
  return (
    <section className="h-full overflow-hidden px-12 pt-7 pr-8">
      <h2 className="text-b-flag leading-tight font-bold">{view.station.name}</h2>
      <ul className="mt-2.5">
        {items.map((item) => (
          <ReadinessRow key={item.key + item.sentence.code} item={item} tight={items.length > 4} />
        ))}
      </ul>
    </section>
  );
}

const rank = (item: ReadinessItem) => ({ bad: 0, soon: 1, good: 2 })[item.state];

function ReadinessRow({ item, tight }: { item: ReadinessItem; tight: boolean }) {
  const t = useTranslations('bench.readiness');
  const say = useSay();
  const { when } = useNumbers();
  const now = useNow();
  const { validFrom, validUntil, state } = item;
  return (
    <li className={`flex gap-5 border-t-2 border-hair ${tight ? 'py-2' : 'py-3.5'}`}>
      <VerdictMark shape={shapes[state]} size="calc(42 * var(--sw-b))" label={t(`state.${state}`)} />
      <div className="min-w-0 flex-1">
        <h3 className="text-b-line leading-tight font-bold">
          {[t(`keys.${item.key}`), item.label].filter(Boolean).join(' ')}
        </h3>
        <p className={`text-b-label leading-snug ${state === 'bad' ? 'font-bold text-reject' : 'text-ink-2'}`}>
          {say(item.sentence)}
          {validUntil && state !== 'bad' ? ` ${t('until', { date: when(validUntil) })}` : null}
        </p>
        {validFrom && validUntil && !tight && (
          <div className="mt-1.5 max-w-122.5">
            <TimeBar from={Date.parse(validFrom)} until={Date.parse(validUntil)} now={now} />
          </div>
        )}
      </div>
    </li>
  );
}

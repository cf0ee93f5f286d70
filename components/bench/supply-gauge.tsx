import { useTranslations } from 'next-intl';
import type { SupplyView } from '@/lib/contracts/bench-view';
import { useNumbers } from './use-numbers';
import { VerdictMark } from '../ui/verdict-mark';

const width = 320;
const x = (volts: number) => 4 + (Math.min(10, Math.max(0, volts)) / 10) * (width - 8);

/** What was read back at the fixture, and whether it is below 2 V. Says nothing safe that was not read. */
export function SupplyGauge({ supply }: { supply: SupplyView }) {
  const t = useTranslations('bench.supply');
  const { oneDigit } = useNumbers();
  if (supply.state === 'maybe-on')
    return (
      <div>
        <p className="text-b-label text-ink-2">{t('atFixture')}</p>
        <p className="font-num text-[calc(96*var(--sw-b))] leading-none font-bold">?</p>
        <p className="mt-3 flex items-center gap-3 text-b-label font-bold">
          <VerdictMark shape="check" size="1em" /> {t('notConfirmed')}
        </p>
      </div>
    );
  const safe = supply.state === 'off' && supply.volts < 2;
  return (
    <div>
      <p className="text-b-label text-ink-2">{t('atFixture')}</p>
      <p className="leading-none">
        <span className="font-num text-[calc(84*var(--sw-b))] font-bold">{oneDigit(supply.volts)}</span>
        <span className="ml-2 text-[calc(54*var(--sw-b))]">V</span>
      </p>
      <svg
        viewBox={`0 0 ${width} 78`}
        aria-hidden="true"
        className="mt-1 block h-auto w-full max-w-80 overflow-visible"
      >
        <path d={`M${x(supply.volts) - 10} 0h20l-10 20z`} fill="var(--sw-ink)" />
        <rect x={x(0)} y={16} width={x(2) - x(0)} height={16} fill="none" stroke="var(--sw-ink)" strokeWidth={3} />
        <path d={`M${x(0)} 33H${x(10)}`} stroke="var(--sw-ink)" strokeWidth={3} />
        {Array.from({ length: 21 }, (_, i) => (
          <path
            key={i}
            d={`M${x(i / 2)} 33v${i % 5 === 0 ? 16 : 9}`}
            stroke={i % 5 === 0 ? 'var(--sw-ink-2)' : 'var(--sw-rule)'}
            strokeWidth={2}
          />
        ))}
        <g className="font-num" fontSize={24} fill="var(--sw-ink-2)" textAnchor="middle">
          <text x={x(0)} y={76} textAnchor="start">
            0
          </text>
          <text x={x(2)} y={76}>
            2
          </text>
          <text x={x(10)} y={76} textAnchor="end">
            10 V
          </text>
        </g>
      </svg>
      <p className="mt-2 text-b-label font-bold">{t(safe ? 'safe' : 'notSafe')}</p>
    </div>
  );
}

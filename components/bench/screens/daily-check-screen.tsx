import { useTranslations } from 'next-intl';
import type { BenchView } from '@/lib/contracts/bench-view';
import { Button } from '../../ui/button';
import { VerdictMark } from '../../ui/verdict-mark';
import { PointMark } from '../../ui/point-mark';
import { useBench } from '../bench-context';
import { BenchFooter } from '../bench-footer';
import { CallButton } from '../call-button';
import { Fitted } from '../fitted';
import { Panes } from '../panes';
import { StationPanel } from '../station-panel';
import { useNumbers } from '../use-numbers';

type DailyCheckView = Extract<BenchView['screen'], { kind: 'daily-check' }>;

/** The reference board's known points against what this station found. */
export function DailyCheckScreen({ screen }: { screen: DailyCheckView }) {
  const t = useTranslations('bench.dailyCheck');
  const { send } = useBench();
  const { when, threeDigits } = useNumbers();
  return (
    <>
      <Panes left={<StationPanel />}>
        <div className="flex h-full flex-col gap-9 px-16 pt-12 pb-6 pr-12">
          <div className="flex items-center gap-10">
            <VerdictMark shape={screen.passed ? 'pass' : 'reject'} size="calc(150 * var(--sw-b))" />
            <Fitted
              as="h1"
              text={t(screen.passed ? 'passed' : 'failed')}
              most={112}
              width={900}
              className={screen.passed ? 'text-pass' : 'text-reject'}
            />
          </div>
          <table className="w-full text-b-line">
            <thead>
              <tr className="text-start text-b-label text-ink-2 [&_th]:text-start [&_th]:font-normal">
                <th scope="col">{t('point')}</th>
                <th scope="col">{t('known')}</th>
                <th scope="col">{t('measured')}</th>
                <th scope="col">{t('within')}</th>
              </tr>
            </thead>
            <tbody>
              {screen.points.map((point) => (
                <tr key={point.quantity} className="border-t-2 border-hair [&_td]:py-4">
                  <td className="font-bold">
                    <PointMark point={point.quantity === 'trip-volts' ? 'trip' : 'release'} />{' '}
                    {t(`points.${point.quantity}`)}
                  </td>
                  <td className="font-num">{threeDigits(point.knownVolts)} V</td>
                  <td className="font-num font-bold">
                    <span className="inline-flex items-center gap-4">
                      <VerdictMark shape={point.passed ? 'pass' : 'reject'} size="1em" />
                      {point.measuredVolts === null ? t('notFound') : `${threeDigits(point.measuredVolts)} V`}
                    </span>
                  </td>
                  <td className="font-num">± {threeDigits(point.toleranceVolts)} V</td>
                </tr>
              ))}
            </tbody>
          </table>
          <p className="text-[calc(44*var(--sw-b))] leading-[1.3]">
            {screen.passed && screen.validUntilIso
              ? t('validUntil', { time: when(screen.validUntilIso) })
              : t('failedText')}
          </p>
        </div>
      </Panes>
      <BenchFooter
        note={t('takeOut')}
        actions={
          <>
            {!screen.passed && <CallButton />}
            <Button size="bench" kind="filled" onClick={() => send({ kind: 'continue' })}>
              {t('continue')}
            </Button>
          </>
        }
      />
    </>
  );
}

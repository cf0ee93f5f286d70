import { useTranslations } from 'next-intl';
import type { RunView } from '@/lib/contracts/bench-view';
import { FindingScreen } from '../trim/finding-screen';
import { FirstBeepScreen } from '../trim/first-beep-screen';
import { MeasuringTrim } from '../trim/measuring-trim';
import { NoEffectScreen } from '../trim/no-effect-screen';
import { PromptedScreen } from '../trim/prompted-screen';
import { SecondBeepScreen } from '../trim/second-beep-screen';

type TrimScreenView = Extract<RunView['screen'], { kind: 'trim' }>;

/** Which of the trim screens: a finding first, then the stage. Without a way to turn the station is measuring. */
export function TrimScreen({ screen }: { screen: TrimScreenView }) {
  const { trim, photo } = screen;
  const t = useTranslations('bench.trim');
  if (trim.finding === 'no-effect') return <NoEffectScreen trim={trim} photo={photo} />;
  if (trim.finding !== null) return <FindingScreen trim={trim} finding={trim.finding} />;
  const advised = trim.direction !== null && trim.turns !== null && trim.words !== null;
  if (trim.stage === 'beep-2') return <SecondBeepScreen trim={trim} />;
  if (trim.stage === 'beep-1' && advised) return <FirstBeepScreen trim={trim} />;
  if (trim.stage === 'turn' && advised) return <PromptedScreen trim={trim} />;
  return <MeasuringTrim trim={trim} title={t(trim.stage === 'stop-turning' ? 'stopTurning' : 'measuring')} />;
}

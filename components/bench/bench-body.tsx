import { useBench } from './bench-context';
import { RunScreen } from './run-screen';
import { BadgeScreen } from './screens/badge-screen';
import { BinScreen } from './screens/bin-screen';
import { ChooseLotScreen } from './screens/choose-lot-screen';
import { CommissioningScreen } from './screens/commissioning-screen';
import { DailyCheckScreen } from './screens/daily-check-screen';
import { EmptyFixtureScreen } from './screens/empty-fixture-screen';
import { IdleScreen } from './screens/idle-screen';
import { MayNotTestScreen } from './screens/may-not-test-screen';
import { PinScreen } from './screens/pin-screen';
import { StartingScreen } from './screens/starting-screen';

/** The screen that the view asks for. */
export function BenchBody() {
  const { view } = useBench();
  const { screen, run } = view;
  switch (screen.kind) {
    case 'badge':
      return <BadgeScreen />;
    case 'pin':
      return <PinScreen screen={screen} />;
    case 'may-not-test':
      return <MayNotTestScreen screen={screen} />;
    case 'choose-lot':
      return <ChooseLotScreen screen={screen} />;
    case 'idle':
      return <IdleScreen screen={screen} />;
    case 'empty-fixture':
      return <EmptyFixtureScreen screen={screen} />;
    case 'run':
      return run ? <RunScreen run={run} binCode={null} /> : <StartingScreen what={{ code: 'opening-instruments' }} />;
    case 'bin':
      return <BinScreen binCode={screen.binCode} />;
    case 'daily-check':
      return <DailyCheckScreen screen={screen} />;
    case 'commissioning':
      return <CommissioningScreen screen={screen} />;
    case 'starting':
      return <StartingScreen what={screen.what} />;
  }
}

import type { RunView } from '@/lib/contracts/bench-view';
import { InstructionScreen } from './screens/instruction-screen';
import { MeasuringScreen } from './screens/measuring-screen';
import { NoVerdictScreen } from './screens/no-verdict-screen';
import { OperatorCheckScreen } from './screens/operator-check-screen';
import { PassScreen } from './screens/pass-screen';
import { RejectScreen } from './screens/reject-screen';
import { SealScreen } from './screens/seal-screen';
import { SeatScreen } from './screens/seat-screen';
import { TrimScreen } from './screens/trim-screen';

/** What the run on the fixture shows. `binCode` while a reject waits for its bin. */
export function RunScreen({ run, binCode }: { run: RunView; binCode: string | null }) {
  const { screen } = run;
  switch (screen.kind) {
    case 'seat':
      return <SeatScreen screen={screen} />;
    case 'measuring':
      return <MeasuringScreen screen={screen} />;
    case 'trim':
      return <TrimScreen screen={screen} />;
    case 'seal':
      return <SealScreen screen={screen} supply={run.supply} />;
    case 'operator-check':
      return <OperatorCheckScreen question={screen.question} />;
    case 'instruction':
      return <InstructionScreen screen={screen} supply={run.supply} />;
    case 'pass':
      return <PassScreen seconds={screen.seconds} />;
    case 'reject':
      return <RejectScreen screen={screen} binCode={binCode} />;
    case 'no-verdict':
      return <NoVerdictScreen screen={screen} run={run} />;
  }
}

'use client';

import { useState } from 'react';
import type { Beep } from './beep/flood-machine';
import { BeepFlood } from './beep/beep-flood';
import { BenchBody } from './bench-body';
import { useBench } from './bench-context';
import { BenchHeader } from './bench-header';
import { BenchSteps } from './bench-steps';
import { BenchTools } from './bench-tools';
import { BenchMenu } from './dialogs/bench-menu';
import { LostBand } from './lost-band';
import type { BenchView } from '@/lib/contracts/bench-view';

/** The whole screen of a station, from its view and the beep that floods it now. */
export function BenchScreen({ flood }: { flood: Beep | null }) {
  const { lost } = useBench();
  const [menu, setMenu] = useState(false);
  return (
    <div className="sw-bench relative flex min-h-dvh flex-col overflow-x-hidden bg-paper text-ink min-[900px]:h-full min-[900px]:min-h-0 min-[900px]:overflow-hidden">
      {lost && <LostBand />}
      <BenchHeader tools={<BenchTools onMenu={() => setMenu(true)} />} />
      <BenchSteps />
      <main className="flex min-h-0 flex-1 flex-col">
        <BenchBody />
      </main>
      {flood !== null && <BeepFlood key={flood} beep={flood} />}
      <BenchMenu open={menu} onOpenChange={setMenu} />
    </div>
  );
}

/** The beep whose reading is going on. */
export function heardBeep({ run }: BenchView): Beep | null {
  if (run?.screen.kind !== 'trim') return null;
  const { stage } = run.screen.trim;
  return stage === 'beep-1-heard' ? 1 : stage === 'beep-2-heard' ? 2 : null;
}

'use client';

import { useState } from 'react';
import { FloodLayer } from './beep/flood-layer';
import type { FloodStore } from './beep/flood-store';
import { BenchBody } from './bench-body';
import { useBench } from './bench-context';
import { BenchHeader } from './bench-header';
import { BenchSteps } from './bench-steps';
import { BenchTools } from './bench-tools';
import { BenchMenu } from './dialogs/bench-menu';
import { EngineeringBand } from './engineering-band';
import { LostBand } from './lost-band';

/** The whole screen of a station, from its view and the flood over it. */
export function BenchScreen({ flood }: { flood: FloodStore }) {
  const { lost } = useBench();
  const [menu, setMenu] = useState(false);
  return (
    <div className="sw-bench relative flex min-h-dvh flex-col overflow-x-hidden bg-paper text-ink min-[900px]:h-full min-[900px]:min-h-0 min-[900px]:overflow-hidden">
      {lost && <LostBand />}
      <EngineeringBand />
      <BenchHeader tools={<BenchTools onMenu={() => setMenu(true)} />} />
      <BenchSteps />
      <main className="flex min-h-0 flex-1 flex-col">
        <BenchBody />
      </main>
      <FloodLayer flood={flood} />
      <BenchMenu open={menu} onOpenChange={setMenu} />
    </div>
  );
}

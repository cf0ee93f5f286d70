'use client';

import { NextIntlClientProvider } from 'next-intl';
import { useCallback, useEffect, useState } from 'react';
import type { BenchCommand } from '@/lib/contracts/bench-command';
import { benchCatalogue } from '@/lib/messages/bench-locales';
import { showScheme } from '../ui/scheme';
import { browserClock } from './beep/browser-clock';
import { createFloodStore } from './beep/flood-store';
import { BenchProvider } from './bench-context';
import { BenchScreen } from './bench-screen';
import { ConnectingScreen } from './connecting-screen';
import { HandsDrawer } from './hands/hands-drawer';
import { useBenchLink } from './live/use-bench-link';
import { useRefusal } from './live/use-refusal';
import { useScanner } from './scanner/use-scanner';
import { useBenchSound } from './sound/use-bench-sound';

const browserTimeZone = () => Intl.DateTimeFormat().resolvedOptions().timeZone;

/** A bench in the browser: connection, scanner, sounds and the screen of its station. */
export function BenchClient({ station }: { station: string }) {
  const [flood] = useState(() => createFloodStore(browserClock));
  const link = useBenchLink(station, flood);
  const { view, command } = link;
  const { refusal, take } = useRefusal(view);
  const { sound, toggle, play } = useBenchSound(view, flood);
  const [timeZone] = useState(browserTimeZone);
  const { locale, messages } = benchCatalogue(view?.operator?.locale);

  const send = useCallback((asked: BenchCommand) => void command(asked).then(take), [command, take]);
  const scan = (text: string) => {
    if (text === '') return;
    void command({ kind: 'scan', text: text.slice(0, 80) }).then((reply) => {
      play(reply.ok ? 'scan-accepted' : 'scan-refused');
      take(reply);
    });
  };
  useScanner({ onScan: scan, onStop: () => send({ kind: 'stop' }) });

  const scheme = view?.station.scheme;
  useEffect(() => {
    if (scheme) showScheme(scheme);
  }, [scheme]);
  useEffect(() => {
    document.documentElement.lang = locale;
  }, [locale]);

  return (
    <NextIntlClientProvider locale={locale} messages={messages} timeZone={timeZone}>
      {view ? (
        <BenchProvider
          value={{
            view,
            leads: link.leads,
            lost: link.lost || link.refusedCode !== null,
            refusal,
            readings: link.readings,
            send,
            sound,
            toggleSound: toggle,
          }}
        >
          <div className="flex min-h-dvh min-[900px]:h-dvh max-[900px]:flex-col">
            <div className="sw-stage min-w-0 flex-1">
              <BenchScreen flood={flood} />
            </div>
            {view.station.simulated && link.hands && link.leads && (
              <HandsDrawer hands={link.hands} view={view} send={link.handsCommand} scan={scan} />
            )}
          </div>
        </BenchProvider>
      ) : (
        <ConnectingScreen refusedCode={link.refusedCode} lost={link.lost} />
      )}
    </NextIntlClientProvider>
  );
}

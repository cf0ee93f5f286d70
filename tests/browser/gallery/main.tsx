import '@fontsource-variable/atkinson-hyperlegible-next';
import '@fontsource-variable/atkinson-hyperlegible-mono';
import '@/app/globals.css';
import { NextIntlClientProvider } from 'next-intl';
import { createRoot } from 'react-dom/client';
import { flushSync } from 'react-dom';
import { BenchClient } from '@/components/bench/bench-client';
import { BenchProvider } from '@/components/bench/bench-context';
import { BenchScreen } from '@/components/bench/bench-screen';
import { HandsDrawer } from '@/components/bench/hands/hands-drawer';
import { createReadingStore } from '@/components/bench/live/reading-store';
import { showScheme, type Scheme } from '@/components/ui/scheme';
import { benchCatalogue } from '@/lib/messages/bench-locales';
import { Kit } from './kit';
import { standingFlood } from './standing-flood';
import { practiceHands, type GalleryView } from './samples';
import { galleryViews } from './views';

/** One screen of the gallery. Another is shown by `showScreen`, without loading the page again. */
export interface Shown {
  screen: string;
  scheme?: Scheme;
  locale?: string;
}
declare global {
  interface Window {
    showScreen: (shown: Shown) => void;
  }
}

function Bench({ shown, locale }: { shown: GalleryView; locale: string }) {
  const readings = createReadingStore();
  readings.push(shown.reading ?? null);
  const answer = async () => ({ ok: true }) as const;
  return (
    <NextIntlClientProvider {...benchCatalogue(locale)} timeZone="UTC">
      <BenchProvider
        value={{
          view: shown.view,
          leads: shown.leads ?? true,
          lost: shown.lost ?? false,
          refusal: shown.view.refusal,
          readings,
          send: () => {},
          sound: shown.sound ?? 'on',
          toggleSound: () => {},
        }}
      >
        <div className="flex min-h-dvh max-[900px]:flex-col min-[900px]:h-dvh">
          <div className="sw-stage min-w-0 flex-1">
            <BenchScreen flood={standingFlood(shown.view)} />
          </div>
          {shown.practice && <HandsDrawer hands={practiceHands} view={shown.view} send={answer} scan={() => {}} />}
        </div>
      </BenchProvider>
    </NextIntlClientProvider>
  );
}

function Screens() {
  return (
    <ul>
      {['kit', ...Object.keys(galleryViews)].map((key) => (
        <li key={key}>
          <a href={`?screen=${key}`}>{key}</a>
        </li>
      ))}
    </ul>
  );
}

const root = createRoot(document.getElementById('root')!);
window.showScreen = ({ screen, scheme = 'day', locale = 'en' }) => {
  showScheme(scheme);
  document.documentElement.lang = locale;
  const shown = galleryViews[screen];
  const key = `${screen} ${locale}`;
  // The whole bench as it runs, connected to whatever serves this page.
  if (screen === 'live') return root.render(<BenchClient station="station-3" />);
  flushSync(() =>
    root.render(screen === 'kit' ? <Kit /> : shown ? <Bench key={key} shown={shown} locale={locale} /> : <Screens />),
  );
};

const query = new URLSearchParams(location.search);
window.showScreen({
  screen: query.get('screen') ?? '',
  scheme: query.get('scheme') === 'night' ? 'night' : 'day',
  locale: query.get('locale') ?? 'en',
});

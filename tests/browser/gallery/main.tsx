import '@fontsource-variable/atkinson-hyperlegible-next';
import '@fontsource-variable/atkinson-hyperlegible-mono';
import '@/app/globals.css';
import { NextIntlClientProvider } from 'next-intl';
import { createRoot } from 'react-dom/client';
import { BenchProvider } from '@/components/bench/bench-context';
import { BenchScreen, heardBeep } from '@/components/bench/bench-screen';
import { createReadingStore } from '@/components/bench/live/reading-store';
import { showScheme } from '@/components/ui/scheme';
import { benchCatalogue } from '@/lib/messages/bench-locales';
import { Kit } from './kit';
import { galleryViews } from './views';

/** One screen of the gallery: ?screen=02-idle&scheme=night&locale=de. Without a screen, a list of all. */
const query = new URLSearchParams(location.search);
const scheme = query.get('scheme');
showScheme(scheme === 'night' ? 'night' : 'day');

function Shown() {
  const name = query.get('screen');
  const { locale, messages } = benchCatalogue(query.get('locale') ?? 'en');
  if (name === 'kit') return <Kit />;
  const shown = name ? galleryViews[name] : undefined;
  if (!shown)
    return (
      <ul>
        {['kit', ...Object.keys(galleryViews)].map((key) => (
          <li key={key}>
            <a href={`?screen=${key}`}>{key}</a>
          </li>
        ))}
      </ul>
    );
  const readings = createReadingStore();
  readings.push(shown.reading ?? null);
  return (
    <NextIntlClientProvider locale={locale} messages={messages} timeZone="UTC">
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
        <div className="sw-stage min-[900px]:h-dvh">
          <BenchScreen flood={heardBeep(shown.view)} />
        </div>
      </BenchProvider>
    </NextIntlClientProvider>
  );
}

document.documentElement.lang = query.get('locale') ?? 'en';
createRoot(document.getElementById('root')!).render(<Shown />);

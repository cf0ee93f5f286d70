import de from './de.json';
import en from './en.json';

/** Languages of the bench, each complete; an operator chooses. */
export const benchLocales = [
  { locale: 'en', name: 'English' },
  { locale: 'de', name: 'Deutsch' },
] as const;

const catalogues: Record<string, typeof en> = { en, de };

/** The catalogue of a language; English where there is none. */
export function benchCatalogue(locale: string | undefined): { locale: string; messages: typeof en } {
  const messages = locale ? catalogues[locale] : undefined;
  return messages && locale ? { locale, messages } : { locale: 'en', messages: en };
}

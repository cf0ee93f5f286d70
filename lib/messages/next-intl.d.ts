import type en from './en.json';

/** Keys of the catalogue are checked by the compiler. */
declare module 'next-intl' {
  interface AppConfig {
    Messages: typeof en;
  }
}

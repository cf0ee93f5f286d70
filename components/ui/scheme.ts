/** Name of the cookie that keeps a person's choice of day or night; absent means as the system says. */
export const schemeCookie = 'sw-scheme';

export type Scheme = 'day' | 'night' | 'system';

/** Sets the scheme of the whole document. */
export function showScheme(scheme: Scheme) {
  const root = document.documentElement;
  if (scheme === 'system') delete root.dataset.bench;
  else root.dataset.bench = scheme;
}

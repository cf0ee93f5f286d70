import type { Metadata, Viewport } from 'next';
import { cookies } from 'next/headers';
import type { ReactNode } from 'react';
import '@fontsource-variable/atkinson-hyperlegible-next';
import '@fontsource-variable/atkinson-hyperlegible-mono';
import './globals.css';
import { schemeCookie } from '@/components/ui/scheme';

export const metadata: Metadata = {
  title: { default: 'Sillwright', template: '%s · Sillwright' },
  description: 'Calibration of undervoltage-cutoff boards at the end of the line',
};
export const viewport: Viewport = { width: 'device-width', initialScale: 1 };

/** Fonts, tokens and the chosen scheme (day, night, or as the system says) for every page. */
export default async function RootLayout({ children }: { children: ReactNode }) {
  const chosen = (await cookies()).get(schemeCookie)?.value;
  const scheme = chosen === 'day' || chosen === 'night' ? chosen : undefined;
  return (
    <html lang="en" data-bench={scheme}>
      <body>{children}</body>
    </html>
  );
}

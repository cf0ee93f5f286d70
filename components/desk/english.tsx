'use client';

import { NextIntlClientProvider } from 'next-intl';
import type { ReactNode } from 'react';
import en from '@/lib/messages/en.json';
import { useTimeZone } from './time';

/** Lets a desk page draw pieces of the bench and say its sentences, in English. */
export function English({ children }: { children: ReactNode }) {
  const timeZone = useTimeZone();
  return (
    <NextIntlClientProvider locale="en" messages={en} timeZone={timeZone}>
      {children}
    </NextIntlClientProvider>
  );
}

import type { Metadata } from 'next';
import type { ReactNode } from 'react';

// The address is a secret that only the paper has: no search engine keeps it, no other site hears it.
export const metadata: Metadata = {
  title: 'Certificate',
  robots: { index: false, follow: false, nocache: true },
  referrer: 'no-referrer',
};

export default function VerifyLayout({ children }: { children: ReactNode }) {
  return children;
}

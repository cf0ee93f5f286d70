import Link from 'next/link';
import type { ReactNode } from 'react';
import { Mark } from './mark';
import { NavLinks, type NavLink } from './nav-links';
import type { Scheme } from './scheme';
import { SchemeSwitch } from './scheme-switch';
import { ToastProvider } from './toast';

interface DeskShellProps {
  links: readonly NavLink[];
  /** Where the mark leads. */
  home?: string;
  /** Right of the menu: search, the person's name and role, sign out. */
  aside?: ReactNode;
  scheme?: Scheme;
  children: ReactNode;
}

/** Every page at a desk: mark, menu between jaws, a strip for notices at the foot. Margins 48 px, on a phone 18. */
export function DeskShell({ links, home = '/', aside, scheme = 'system', children }: DeskShellProps) {
  return (
    <ToastProvider>
      <a className="sw-skip" href="#content">
        Skip to the content
      </a>
      <header className="sw-screen-only flex flex-wrap items-stretch gap-x-6 border-b-2 border-ink px-12 max-sm:px-[18px]">
        <Link href={home} className="flex min-h-14 items-center gap-3 text-[19px] font-bold">
          <Mark size={30} />
          Sillwright
        </Link>
        <NavLinks links={links} />
        <div className="ml-auto flex items-center gap-5 text-cap text-ink-2">
          {aside}
          <SchemeSwitch initial={scheme} />
        </div>
      </header>
      <main id="content" tabIndex={-1} className="px-12 pt-5 pb-16 outline-none max-sm:px-[18px]">
        {children}
      </main>
    </ToastProvider>
  );
}

'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';

export interface NavLink {
  href: string;
  label: string;
}

/** The link whose address is the longest beginning of `path`, or null. */
export function currentLink(links: readonly NavLink[], path: string): NavLink | null {
  const within = links.filter((link) => path === link.href || path.startsWith(`${link.href}/`));
  return within.sort((a, b) => b.href.length - a.href.length)[0] ?? null;
}

/** The main menu; the current word stands between gauge jaws. On a phone it scrolls sideways under the mark. */
export function NavLinks({ links }: { links: readonly NavLink[] }) {
  const current = currentLink(links, usePathname());
  return (
    <nav aria-label="Main" className="flex min-w-0 self-end overflow-x-auto max-sm:order-3 max-sm:w-full">
      <ul className="sw-jaws !border-0 [&>li]:px-3.5!">
        {links.map((link) => (
          <li key={link.href} aria-current={link === current ? 'true' : undefined}>
            <Link
              href={link.href}
              aria-current={link === current ? 'page' : undefined}
              className="flex min-h-9 items-end text-[16px] hover:text-accent max-sm:min-h-[46px] max-sm:items-center"
            >
              {link.label}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}

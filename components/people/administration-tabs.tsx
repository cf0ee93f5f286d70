'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';

const tabs = [
  { href: '/administration/people', label: 'People and roles' },
  { href: '/administration/stations', label: 'Stations' },
  { href: '/administration/printers', label: 'Printers' },
];

/** The parts of administration, beside the title. */
export function AdministrationTabs() {
  const path = usePathname();
  return (
    <nav aria-label="Administration" className="flex flex-wrap gap-x-6 gap-y-1">
      {tabs.map(({ href, label }) =>
        path.startsWith(href) ? (
          <Link key={href} href={href} aria-current="page" className="border-b-[3px] border-ink py-1 font-bold">
            {label}
          </Link>
        ) : (
          <Link key={href} href={href} className="sw-link">
            {label}
          </Link>
        ),
      )}
    </nav>
  );
}

import Link from 'next/link';

const tabs = [
  { href: '/instruments', label: 'Instruments' },
  { href: '/reference-boards', label: 'Reference boards' },
  { href: '/training', label: 'Training' },
] as const;

/** What must be in order before stations may test; the page that is shown stands bold. */
export function EngineeringTabs({ current }: { current: (typeof tabs)[number]['href'] }) {
  return (
    <nav aria-label="What stations need" className="flex flex-wrap gap-x-6">
      {tabs.map((tab) =>
        tab.href === current ? (
          <b key={tab.href} aria-current="page" className="border-b-4 border-ink">
            {tab.label}
          </b>
        ) : (
          <Link key={tab.href} href={tab.href} className="sw-link">
            {tab.label}
          </Link>
        ),
      )}
    </nav>
  );
}

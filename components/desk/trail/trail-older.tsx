'use client';

import Link from 'next/link';
import { usePathname, useSearchParams } from 'next/navigation';

/** To older entries, and back to the newest. */
export function TrailOlder({ older, newest }: { older: number | null; newest: boolean }) {
  const path = usePathname();
  const query = useSearchParams();
  const to = (before: number | null) => {
    const next = new URLSearchParams(query);
    if (before === null) next.delete('before');
    else next.set('before', String(before));
    return next.size > 0 ? `${path}?${next}` : path;
  };
  return (
    <div className="mt-4 flex flex-wrap items-baseline justify-between gap-4 text-cap text-ink-2">
      <p>A filled square is a head of its chain that was kept. A broken link would be a red gap.</p>
      <span className="flex gap-6 sw-screen-only">
        {newest ? null : (
          <Link className="sw-link" href={to(null)}>
            Newest entries
          </Link>
        )}
        {older === null ? null : (
          <Link className="sw-link" href={to(older)}>
            Older entries
          </Link>
        )}
      </span>
    </div>
  );
}

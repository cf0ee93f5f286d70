'use client';

import { usePathname, useRouter, useSearchParams } from 'next/navigation';
import { FillIn } from '@/components/ui/fill-in';

/** A day that is part of the address. Empty: any. */
export function AddressDate({ name, label, value }: { name: string; label: string; value: string }) {
  const router = useRouter();
  const path = usePathname();
  const query = useSearchParams();
  return (
    <FillIn
      type="date"
      label={label}
      defaultValue={value}
      key={value}
      onChange={(event) => {
        const next = new URLSearchParams(query);
        if (event.target.value) next.set(name, event.target.value);
        else next.delete(name);
        router.push(next.size > 0 ? `${path}?${next}` : path);
      }}
    />
  );
}

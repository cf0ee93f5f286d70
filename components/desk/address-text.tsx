'use client';

import { usePathname, useRouter, useSearchParams } from 'next/navigation';
import { FillIn } from '@/components/ui/fill-in';

/** A gap to write in that is part of the address: taken with Enter or on leaving the field. Empty: any. */
export function AddressText({ name, label, value }: { name: string; label: string; value: string }) {
  const router = useRouter();
  const path = usePathname();
  const query = useSearchParams();
  const take = (text: string) => {
    if (text.trim() === value) return;
    const next = new URLSearchParams(query);
    if (text.trim()) next.set(name, text.trim());
    else next.delete(name);
    next.delete('page');
    router.push(next.size > 0 ? `${path}?${next}` : path);
  };
  return (
    <FillIn
      key={value}
      label={label}
      defaultValue={value}
      placeholder="any"
      size={12}
      onBlur={(event) => take(event.currentTarget.value)}
      onKeyDown={(event) => {
        if (event.key === 'Enter') take(event.currentTarget.value);
      }}
    />
  );
}
